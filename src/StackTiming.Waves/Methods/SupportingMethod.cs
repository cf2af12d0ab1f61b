using System.Collections.Immutable;
using StackTiming.Lines.Fields;

namespace StackTiming.Waves.Methods;

/// <summary>A published method behind a result that is not a closed form of a cross-section.</summary>
/// <param name="Id">Short id.</param>
/// <param name="Name">Name.</param>
/// <param name="Purpose">What it computes.</param>
/// <param name="Source">Full reference.</param>
/// <param name="Validity">Where it holds.</param>
/// <param name="Proof">What the tests hold it to, with the limit.</param>
public sealed record SupportingMethod(string Id, string Name, string Purpose, string Source, string Validity, string Proof)
{
    /// <summary>All of them.</summary>
    public static ImmutableArray<SupportingMethod> All { get; } =
    [
        new(
            FieldSolver.MethodId, "Field solver (boundary elements)", "C, L and energy shares of any cross-section; the judge of the closed forms",
            "C. Wei, R. F. Harrington, J. R. Mautz, T. K. Sarkar, \"Multiconductor transmission lines in multilayered dielectric media\", IEEE Trans. MTT-32, 1984, pp. 439–450",
            "quasi-static: height over the plane a small part of the wavelength",
            "independent finite-element and exact sections: 0.1 % in impedance, permittivity and matrix entries"),
        new(
            "characteristics", "Method of characteristics", "waveforms on networks of lossless and coupled lines",
            "L. Bergeron, Du coup de bélier en hydraulique au coup de foudre en électricité, Dunod 1949; F. H. Branin, \"Transient analysis of lossless transmission lines\", Proc. IEEE 55, 1967, pp. 2012–2013",
            "linear drivers and receivers, lines without loss",
            "independent complex-frequency responses: 0.1 ps and 0.1 % of the swing in every metric"),
        new(
            "nodal-frequency", "Nodal solution in the complex-frequency plane", "waveforms on networks with lossy lines",
            "H. Dubner, J. Abate, \"Numerical inversion of Laplace transforms by relating them to the finite Fourier cosine transform\", J. ACM 15, 1968, pp. 115–123",
            "linear networks",
            "independent complex-frequency responses: 0.1 ps and 0.1 % of the swing; erfc response of Wigington and Nahman 1957; diffusion"),
        new(
            "wideband-debye", "Wideband Debye", "Dk and Df at other frequencies than the stated one",
            "A. R. Djordjević, R. M. Biljić, V. D. Likar-Smiljanić, T. K. Sarkar, \"Wideband frequency-domain characterization of FR-4 and time-domain causality\", IEEE Trans. EMC 43, 2001, pp. 662–667",
            "1 kHz to 1 THz, loss tangent nearly constant", "published model's own values"),
        new(
            "incremental-inductance", "Incremental inductance rule", "conductor loss and internal inductance",
            "H. A. Wheeler, \"Formulas for the skin effect\", Proc. IRE 30, 1942, pp. 412–424",
            "copper several skin depths thick; below that the direct-current resistance bounds it", "the solver's surface currents: 3 % at skin effect"),
        new(
            "roughness", "Roughness factor", "additional loss of rough copper",
            "E. Hammerstad, Ø. Jensen, IEEE MTT-S Symposium Digest, 1980, after S. P. Morgan, J. Appl. Phys. 20, 1949",
            "saturates at twice the smooth loss", "published factors"),
        new(
            "coaxial-via", "Via as a short coaxial line", "delay, inductance and capacitance of vias",
            "elementary (concentric cylinders); second opinions: H. W. Johnson, M. Graham, High-Speed Digital Design, Prentice Hall 1993; M. E. Goldfarb, R. A. Pucel, IEEE Microwave and Guided Wave Letters 1, 1991",
            "planes around the via on every layer; lies low where planes are few", "exact coaxial lines; no independent reference for whole vias"),
    ];
}
