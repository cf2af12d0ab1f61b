namespace StackTiming.Lines.Loss;

/// <summary>
/// The constants per metre that one wave meets: those of a single signal, or of a pair under voltages ±1/2 with currents ±1 (differential) and
/// under one voltage with half the current in each trace (common).
/// </summary>
/// <param name="ResistanceOhmPerMetre">Series resistance, ohm/m.</param>
/// <param name="InductanceHenryPerMetre">Series inductance, H/m.</param>
/// <param name="ConductanceSiemensPerMetre">Shunt conductance, S/m.</param>
/// <param name="CapacitanceFaradPerMetre">Shunt capacitance, F/m.</param>
public readonly record struct ModeConstants(
    double ResistanceOhmPerMetre, double InductanceHenryPerMetre, double ConductanceSiemensPerMetre, double CapacitanceFaradPerMetre)
{
    /// <summary>The constants of a wave.</summary>
    /// <param name="line">A line of one or two signals.</param>
    /// <param name="mode">Index into <see cref="LineAtFrequency.Modes"/>.</param>
    public static ModeConstants Of(LineAtFrequency line, int mode) => Of(
        mode, line.ResistanceOhmPerMetre, line.InductanceHenryPerMetre, line.ConductanceSiemensPerMetre, line.CapacitanceFaradPerMetre);

    internal static int Count(int signals) => signals <= 2 ? signals : 0;

    internal static string Name(int signals, int mode) => signals == 1 ? "single" : mode == 0 ? "differential" : "common";

    internal static ModeConstants Of(int mode, double[,] r, double[,] l, double[,] g, double[,] c)
    {
        if (l.GetLength(0) == 1)
            return new(r[0, 0], l[0, 0], g[0, 0], c[0, 0]);
        return mode == 0
            ? new(Sum(r, -1), Sum(l, -1), 0.25 * Sum(g, -1), 0.25 * Sum(c, -1))
            : new(0.25 * Sum(r, 1), 0.25 * Sum(l, 1), Sum(g, 1), Sum(c, 1));
    }

    private static double Sum(double[,] m, int sign) => m[0, 0] + m[1, 1] + sign * (m[0, 1] + m[1, 0]);
}
