using System.Globalization;

namespace StackTiming.Waves.Networks;

/// <summary>The part of a network that a problem is about, so that a reader can say where it stands in the file.</summary>
public enum NetworkPart
{
    /// <summary>The network as a whole.</summary>
    Whole,
    /// <summary>The driver.</summary>
    Driver,
    /// <summary>The stimulus.</summary>
    Stimulus,
    /// <summary>A line without loss.</summary>
    Line,
    /// <summary>A line with loss.</summary>
    LossyLine,
    /// <summary>A group of coupled lines.</summary>
    CoupledLines,
    /// <summary>A series element.</summary>
    Series,
    /// <summary>A shunt element.</summary>
    Shunt,
    /// <summary>A receiver.</summary>
    Receiver,
}

/// <summary>Something that keeps a network from being solved.</summary>
/// <param name="Part">What kind of element it is about.</param>
/// <param name="Index">Which of them, from 0; 0 for the whole.</param>
/// <param name="Message">What is wrong.</param>
/// <param name="Advice">What to do instead.</param>
public sealed record NetworkProblem(NetworkPart Part, int Index, string Message, string Advice);

/// <summary>Finds everything that keeps a network from being solved.</summary>
public static class NetworkCheck
{
    /// <summary>The longest window, as a multiple of the shortest ramp, that is accepted.</summary>
    public const double LongestWindowInRamps = 1e6;

    /// <summary>The problems of a network; empty where it can be solved.</summary>
    /// <param name="network">The network.</param>
    public static IReadOnlyList<NetworkProblem> Problems(Network network)
    {
        var problems = new List<NetworkProblem>();
        CheckStimulus(network, problems);
        CheckDriver(network, problems);
        for (var i = 0; i < network.Lines.Length; i++)
        {
            var line = network.Lines[i];
            Positive(problems, NetworkPart.Line, i, "z0", line.Z0Ohms, "ohm");
            Positive(problems, NetworkPart.Line, i, "delay", line.DelaySeconds, "s");
            Ends(problems, NetworkPart.Line, i, network, line.From, line.To);
        }
        for (var i = 0; i < network.LossyLines.Length; i++)
        {
            var line = network.LossyLines[i];
            Positive(problems, NetworkPart.LossyLine, i, "length", line.LengthMetres, "m");
            Positive(problems, NetworkPart.LossyLine, i, "l", line.Constants.InductanceHenryPerMetre, "H/m");
            Positive(problems, NetworkPart.LossyLine, i, "c", line.Constants.CapacitanceFaradPerMetre, "F/m");
            NotNegative(problems, NetworkPart.LossyLine, i, "r-dc", line.Constants.DcResistanceOhmPerMetre, "ohm/m");
            NotNegative(problems, NetworkPart.LossyLine, i, "r-skin", line.Constants.SkinResistance, "ohm/m/sqrtHz");
            NotNegative(problems, NetworkPart.LossyLine, i, "df", line.Constants.Df, "");
            if (line.Constants.Df > 0)
                Positive(problems, NetworkPart.LossyLine, i, "at", line.Constants.AtHertz, "Hz");
            Ends(problems, NetworkPart.LossyLine, i, network, line.From, line.To);
        }
        for (var i = 0; i < network.CoupledLines.Length; i++)
        {
            foreach (var mode in network.CoupledLines[i].Modes)
            {
                Positive(problems, NetworkPart.CoupledLines, i, "the impedance of a mode", mode.ImpedanceOhms, "ohm");
                Positive(problems, NetworkPart.CoupledLines, i, "the delay of a mode", mode.DelaySeconds, "s");
            }
        }
        for (var i = 0; i < network.Series.Length; i++)
        {
            var branch = network.Series[i];
            NotNegative(problems, NetworkPart.Series, i, "resistance", branch.ResistanceOhms, "ohm");
            NotNegative(problems, NetworkPart.Series, i, "inductance", branch.InductanceHenries, "H");
            if (branch.CapacitanceFarads is { } farads)
                Positive(problems, NetworkPart.Series, i, "capacitance", farads, "F");
            Ends(problems, NetworkPart.Series, i, network, branch.From, branch.To);
        }
        for (var i = 0; i < network.Shunts.Length; i++)
        {
            var shunt = network.Shunts[i];
            NotNegative(problems, NetworkPart.Shunt, i, "capacitance", shunt.CapacitanceFarads, "F");
            if (shunt.ResistanceOhms is { } ohms)
                Positive(problems, NetworkPart.Shunt, i, "resistance", ohms, "ohm");
            if (shunt.InductanceHenries is { } henries)
                Positive(problems, NetworkPart.Shunt, i, "inductance", henries, "H");
        }
        for (var i = 0; i < network.Receivers.Length; i++)
        {
            var receiver = network.Receivers[i];
            NotNegative(problems, NetworkPart.Receiver, i, "capacitance", receiver.CapacitanceFarads, "F");
            if (receiver.ResistanceOhms is { } ohms)
                Positive(problems, NetworkPart.Receiver, i, "resistance", ohms, "ohm");
        }
        if (network.Receivers.IsEmpty)
            problems.Add(new(NetworkPart.Whole, 0, "the net has no receiver", "name at least one node at which the response is judged"));
        CheckConnection(network, problems);
        return problems;
    }

    private static void CheckStimulus(Network network, List<NetworkProblem> problems)
    {
        var stimulus = network.Stimulus;
        Positive(problems, NetworkPart.Stimulus, 0, "rise", stimulus.RiseSeconds, "s");
        Positive(problems, NetworkPart.Stimulus, 0, "fall", stimulus.FallSeconds, "s");
        Positive(problems, NetworkPart.Stimulus, 0, "duration", network.DurationSeconds, "s");
        if (network.DurationSeconds > LongestWindowInRamps * stimulus.ShortestRampSeconds)
            problems.Add(new(NetworkPart.Stimulus, 0, "the window is more than a million ramps long", "shorten 'duration' or lengthen the ramp"));
        if (stimulus.Edge != Edge.Pattern)
            return;
        if (stimulus.Bits.IsEmpty)
            problems.Add(new(NetworkPart.Stimulus, 0, "the pattern has no bits", "write pattern: \"010\""));
        Positive(problems, NetworkPart.Stimulus, 0, "bit", stimulus.BitSeconds, "s");
        if (stimulus.BitSeconds < Math.Max(stimulus.RiseSeconds, stimulus.FallSeconds))
            problems.Add(new(NetworkPart.Stimulus, 0, "a bit is shorter than a ramp", "make 'bit' at least as long as 'rise' and 'fall'"));
    }

    private static void CheckDriver(Network network, List<NetworkProblem> problems)
    {
        var driver = network.Driver;
        Positive(problems, NetworkPart.Driver, 0, "resistance", driver.ResistanceOhms, "ohm");
        if (driver.Package is { } package)
        {
            NotNegative(problems, NetworkPart.Driver, 0, "inductance", package.InductanceHenries, "H");
            NotNegative(problems, NetworkPart.Driver, 0, "capacitance", package.CapacitanceFarads, "F");
        }
        if (!double.IsFinite(driver.LowVolts) || !double.IsFinite(driver.HighVolts) || driver.LowVolts >= driver.HighVolts)
            problems.Add(new(NetworkPart.Driver, 0, "the low level is not below the high level", "write low: 0 V, high: 1.8 V"));
    }

    private static void CheckConnection(Network network, List<NetworkProblem> problems)
    {
        var reached = new NodeSets(network.NodeNames.Length);
        foreach (var line in network.Lines)
            reached.Join(line.From, line.To);
        foreach (var line in network.LossyLines)
            reached.Join(line.From, line.To);
        foreach (var branch in network.Series)
            reached.Join(branch.From, branch.To);
        foreach (var group in network.CoupledLines)
        {
            for (var k = 0; k < group.From.Length; k++)
            {
                reached.Join(group.From[0], group.From[k]);
                reached.Join(group.From[0], group.To[k]);
            }
        }
        for (var node = 0; node < network.NodeNames.Length; node++)
        {
            if (reached.Of(node) == reached.Of(network.Driver.Node))
                continue;
            problems.Add(new(
                NetworkPart.Whole, 0,
                $"no line or series element leads from the driver to '{network.NodeNames[node]}'",
                "connect it or correct its name"));
        }
    }

    private static void Ends(List<NetworkProblem> problems, NetworkPart part, int index, Network network, int from, int to)
    {
        if (from == to)
            problems.Add(new(part, index, $"both ends are at '{network.NodeNames[from]}'", "give it two different ends"));
    }

    private static void Positive(List<NetworkProblem> problems, NetworkPart part, int index, string what, double value, string unit)
    {
        if (!(value > 0) || !double.IsFinite(value))
            problems.Add(new(part, index, string.Create(CultureInfo.InvariantCulture, $"{what} is {value} {unit}"), "it must be above 0"));
    }

    private static void NotNegative(List<NetworkProblem> problems, NetworkPart part, int index, string what, double value, string unit)
    {
        if (!(value >= 0) || !double.IsFinite(value))
            problems.Add(new(part, index, string.Create(CultureInfo.InvariantCulture, $"{what} is {value} {unit}"), "it must not be below 0"));
    }
}
