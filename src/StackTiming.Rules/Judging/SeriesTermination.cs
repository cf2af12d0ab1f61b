using System.Globalization;
using StackTiming.Rules.Findings;

namespace StackTiming.Rules.Judging;

/// <summary>
/// The resistor that ends reflections at the driver. The first guess is what is missing between the driver's resistance and the impedance of the
/// line that it drives, Z0 − Rs, so that a wave that returns from an open end meets its own impedance; what is proposed has been tried on the net, or says that it has not.
/// </summary>
public static class SeriesTermination
{
    private const double LeastOhms = 2;

    // Loads, vias and branches move the best value away from the guess; these are tried in turn.
    private static readonly double[] Tries = [1, 0.7, 1.4, 2];

    /// <summary>The fix for a net that rings.</summary>
    /// <param name="board">The board.</param>
    /// <param name="judged">The receiver that rings.</param>
    /// <param name="judgement">The rule's judgement, which limits how many fixes are tried.</param>
    /// <param name="holds">Whether the rule would hold with a response to an edge.</param>
    public static Fix? Of(IBoardPhysics board, JudgedResponse judged, Judgement judgement, Func<Edge, ReceiverResponse, bool> holds)
    {
        var driven = judged.Driven;
        if (driven.Model is not { } model || PathLength.LongestTrace(judged.Path) is not { } line || !double.IsFinite(line.Z0Ohms))
            return null;
        var source = model.Resistance.Value;
        var missing = line.Z0Ohms - source - driven.SeriesOhms;
        var figures = $"the {Show(line.Z0Ohms)} line less the {Show(source)} driver leaves {Show(line.Z0Ohms - source)}";
        if (missing >= LeastOhms && !judgement.MayTry())
            return Resistor(driven, line, missing, $"not tried on the net; {figures}");
        foreach (var share in Tries)
        {
            if (missing < LeastOhms)
                break;
            if (Works(board, judged, holds, share * missing))
                return Resistor(driven, line, share * missing, $"tried on the net; {figures}{Cause(driven)}");
        }
        if (LongestStub(driven) is { } stub)
        {
            return new Fix(
                FixKind.Other,
                $"no series resistor at {driven.Driver} mends it: take away the branch to {stub.End} "
                    + $"({DisplayUnit.Millimetres.Show(stub.LengthMetres)}), or run the net through it",
                driven.Net, stub.Layer, double.NaN);
        }
        return new Fix(
            FixKind.EndResistor,
            $"end the net at {judged.Path.Receiver} with {Show(line.Z0Ohms)} to the middle of the swing: no series resistor at "
                + $"{driven.Driver} mends it ({Show(line.Z0Ohms)} line, {Show(source + driven.SeriesOhms)} source)",
            driven.Net, line.Layer, line.Z0Ohms);
    }

    /// <summary>Impedance of the longest trace of a way, ohm; NaN where it has none.</summary>
    /// <param name="path">The way.</param>
    public static double LineOhms(ReceiverPath path) => PathLength.LongestTrace(path)?.Z0Ohms ?? double.NaN;

    /// <summary>A resistance as text.</summary>
    /// <param name="ohms">Resistance, ohm.</param>
    public static string Show(double ohms) => ohms.ToString("F1", CultureInfo.InvariantCulture) + " ohm";

    private static bool Works(IBoardPhysics board, JudgedResponse judged, Func<Edge, ReceiverResponse, bool> holds, double ohms)
    {
        foreach (var (edge, _) in judged.Responses)
        {
            if (board.ResponseWithAddedSeries(judged.Driven, judged.Path.Receiver, edge, ohms) is not { } response || !holds(edge, response))
                return false;
        }
        return true;
    }

    private static Fix Resistor(DrivenNet driven, in PathPiece line, double ohms, string figures)
    {
        if (driven.SeriesOhms <= 0)
            return new Fix(FixKind.SeriesResistor, $"put {Show(ohms)} in series at {driven.Driver} ({figures})", driven.Net, line.Layer, ohms);
        var total = driven.SeriesOhms + ohms;
        return new Fix(FixKind.SeriesResistor, $"raise the series resistor from {Show(driven.SeriesOhms)} to {Show(total)} ({figures})", driven.Net, line.Layer, total);
    }

    private static string Cause(DrivenNet driven) => LongestStub(driven) is { } stub
        ? $"; shortening the branch to {stub.End} of {DisplayUnit.Millimetres.Show(stub.LengthMetres)} may do as well"
        : "";

    private static StubBranch? LongestStub(DrivenNet driven)
    {
        StubBranch? longest = null;
        foreach (var stub in driven.Stubs)
        {
            if (stub.DelaySeconds > (longest?.DelaySeconds ?? 0))
                longest = stub;
        }
        return longest;
    }
}
