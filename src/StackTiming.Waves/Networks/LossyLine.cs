namespace StackTiming.Waves.Networks;

/// <summary>A line with loss between two nodes.</summary>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
/// <param name="LengthMetres">Length in metres; above 0.</param>
/// <param name="Constants">What it is per metre.</param>
public readonly record struct LossyLine(int From, int To, double LengthMetres, LossyLineConstants Constants);

/// <summary>
/// The constants of a line with loss, per metre. Series impedance r_dc + r_skin·√(s/π) + s·l (at a frequency f: r_dc + r_skin·√f·(1+j) + jω·l);
/// shunt admittance s·c·ε(s), where ε(s) is wideband Debye with the real part 1 and the loss tangent <paramref name="Df"/> at
/// <paramref name="AtHertz"/> (Djordjević, Biljić, Likar-Smiljanić and Sarkar, IEEE Trans. EMC 43, 2001).
/// </summary>
/// <param name="InductanceHenryPerMetre">External inductance l, H/m; above 0.</param>
/// <param name="CapacitanceFaradPerMetre">Capacitance c at <paramref name="AtHertz"/>, F/m; above 0.</param>
/// <param name="DcResistanceOhmPerMetre">Resistance at direct current, Ω/m.</param>
/// <param name="SkinResistance">Skin-effect coefficient r_skin, Ω/m/√Hz.</param>
/// <param name="Df">Loss tangent of the dielectric at <paramref name="AtHertz"/>.</param>
/// <param name="AtHertz">Frequency at which <paramref name="CapacitanceFaradPerMetre"/> and <paramref name="Df"/> hold, Hz.</param>
public sealed record LossyLineConstants(
    double InductanceHenryPerMetre,
    double CapacitanceFaradPerMetre,
    double DcResistanceOhmPerMetre,
    double SkinResistance,
    double Df,
    double AtHertz);
