using System.Collections.Immutable;

namespace StackTiming.Lines.Methods;

/// <summary>Every published method of the project, with what the tests measured of it against the references in tests/references/sections.</summary>
public static class MethodCatalogue
{
    /// <summary>Surface microstrip.</summary>
    public static LineMethod HammerstadJensen1980 { get; } = new(
        "hammerstad-jensen-1980", "Hammerstad and Jensen 1980",
        "E. Hammerstad, Ø. Jensen, \"Accurate models for microstrip computer-aided design\", IEEE MTT-S Int. Microwave Symposium Digest, 1980, pp. 407–409",
        "one bare trace on one dielectric over a plane; a trapezoid counts as a rectangle of three parts of its face towards the plane and one of the other",
        "0.01 ≤ w/h ≤ 100, Dk ≤ 128, t ≤ w; relied on for rectangles, a second opinion for trapezoids",
        "thin strip: 0.03 % of the impedance in air, 0.2 % of the effective permittivity",
        [new("F1 bare microstrip", 0.00051, 0.0016), new("g thin microstrip in air", 4.6e-05, 0), new("j thick microstrip in air", 0.007, 0)], IsSecondOpinion: false);

    /// <summary>Surface microstrip, one formula for all widths.</summary>
    public static LineMethod Wheeler1977 { get; } = new(
        "wheeler-1977", "Wheeler 1977",
        "H. A. Wheeler, \"Transmission-line properties of a strip on a dielectric sheet on a plane\", IEEE Trans. MTT-25, 1977, pp. 631–647",
        "one bare trace on one dielectric over a plane",
        "t ≤ h, t ≤ w",
        "2 %",
        [new("F1 bare microstrip", 0.00066, 0.014), new("g thin microstrip in air", 0.011, 0), new("j thick microstrip in air", 0.015, 0)], IsSecondOpinion: true);

    /// <summary>Thin centred stripline.</summary>
    public static LineMethod Cohn1954 { get; } = new(
        "cohn-1954", "Cohn 1954",
        "S. B. Cohn, \"Characteristic impedance of the shielded-strip transmission line\", IRE Trans. MTT-2, 1954, pp. 52–57",
        "one strip without thickness midway between two planes in one dielectric",
        "any w/b, t = 0",
        "exact",
        [new("a thin stripline", 1e-06, 0)], IsSecondOpinion: false);

    /// <summary>Thick centred stripline.</summary>
    public static LineMethod Wheeler1978 { get; } = new(
        "wheeler-1978", "Wheeler 1978",
        "H. A. Wheeler, \"Transmission-line properties of a stripline between parallel planes\", IEEE Trans. MTT-26, 1978, pp. 866–876",
        "one trace between two planes; off the middle and in several dielectrics by capacitance partition; a trapezoid counts as the rectangle of its mean width",
        "w/(b−t) ≤ 10, t ≤ b/2; relied on for centred rectangles in one dielectric, a second opinion otherwise",
        "0.5 %, centred",
        [new("F4 centred stripline", 0.00021, 0), new("F5 offset stripline in two dielectrics", 0.015, 0.0034), new("F6 offset stripline in three dielectrics", 0.0027, 0.016), new("a thin stripline", 0.0041, 0), new("c thin offset stripline", 0.026, 0), new("h thick stripline", 0.0054, 0)], IsSecondOpinion: false);

    /// <summary>Thin edge-coupled stripline.</summary>
    public static LineMethod Cohn1955 { get; } = new(
        "cohn-1955", "Cohn 1955",
        "S. B. Cohn, \"Shielded coupled-strip transmission line\", IRE Trans. MTT-3, 1955, pp. 29–38",
        "two like strips side by side midway between two planes in one dielectric, thickness by the paper's correction",
        "t ≤ b/4, t ≤ gap/2; relied on for t = 0, a second opinion for thick strips",
        "exact for t = 0",
        [new("b thin stripline pair", 1e-06, 0)], IsSecondOpinion: false);

    /// <summary>Thin broadside-coupled stripline.</summary>
    public static LineMethod Cohn1960 { get; } = new(
        "cohn-1960", "Cohn 1960",
        "S. B. Cohn, \"Characteristic impedances of broadside-coupled strip transmission lines\", IRE Trans. MTT-8, 1960, pp. 633–637",
        "two like strips above each other at equal distances from two planes",
        "w ≥ 0.35·s, w ≥ 0.35·(b−s), t ≤ s/50; relied on for t = 0 in one dielectric, a second opinion otherwise",
        "about 1 % of the fringing capacitance at w/s = 0.35, better above",
        [new("i thin broadside pair", 0.0015, 0)], IsSecondOpinion: false);

    /// <summary>Edge-coupled microstrip.</summary>
    public static LineMethod KirschningJansen1984 { get; } = new(
        "kirschning-jansen-1984", "Kirschning and Jansen 1984",
        "M. Kirschning, R. H. Jansen, \"Accurate wide-range design equations for the frequency-dependent characteristic of parallel coupled microstrip lines\", IEEE Trans. MTT-32, 1984, pp. 83–90; MTT-33, 1985, p. 288",
        "two like bare traces side by side on one dielectric over a plane, thin",
        "0.1 ≤ w/h ≤ 10, 0.1 ≤ s/h ≤ 10, Dk ≤ 18, t ≤ s/50",
        "0.6 % of the impedances, 0.7 % of the permittivities",
        [], IsSecondOpinion: true);

    /// <summary>Coplanar line without a plane.</summary>
    public static LineMethod Wen1969 { get; } = new(
        "wen-1969", "Wen 1969",
        "C. P. Wen, \"Coplanar waveguide: a surface strip transmission line suitable for nonreciprocal gyromagnetic device applications\", IEEE Trans. MTT-17, 1969, pp. 1087–1090",
        "a trace without thickness between two wide pours on a thick dielectric, no plane",
        "pours and dielectric ≥ 10 times the slot region, t = 0",
        "exact",
        [new("f thin coplanar in air", 1e-06, 0)], IsSecondOpinion: false);

    /// <summary>Coplanar line over a plane.</summary>
    public static LineMethod GhioneNaldi1983 { get; } = new(
        "ghione-naldi-1983", "Ghione and Naldi 1983",
        "G. Ghione, C. Naldi, \"Parameters of coplanar waveguides with lower ground plane\", Electronics Letters 19, 1983, pp. 734–735",
        "a bare thin trace between two wide pours on one dielectric over a plane",
        "t ≤ gap/50, pours ≥ 2·h, no mask",
        "none",
        [], IsSecondOpinion: true);

    /// <summary>Everything in flat layers over a plane or between two.</summary>
    public static LineMethod Yamashita1968 { get; } = new(
        "yamashita-1968", "Yamashita 1968",
        "E. Yamashita, R. Mittra, \"Variational method for the analysis of microstrip lines\", IEEE Trans. MTT-16, 1968, pp. 251–256; E. Yamashita, \"Variational method for the analysis of microstrip-like transmission lines\", ibid., pp. 529–535",
        "any traces over a plane or between two planes in flat dielectrics: masked, embedded, offset, coupled, broadside, with coplanar pours; a trapezoid is three strips",
        "t ≤ 1.5·w, gap ≥ 1.5·t and ≥ w/20; mask coat 0.1 to 1.5 times the trace's thickness and ≤ 0.3 gaps, height 1 to 12 times the thickness",
        "none for thick traces; random lines of each reference family against the field solver: 0.4 % alone, 1 % coupled, 1.2 % masked, 2.5 % masked and coupled",
        [new("F10 masked coplanar", 0.0017, 0.0044), new("F11 coplanar pair", 0.0014, 0.00086), new("F12 three masked traces", 0.00094, 0.0072), new("F1 bare microstrip", 0.0013, 0.00046), new("F2 masked microstrip", 0.0019, 0.0036), new("F3 embedded microstrip", 0.0021, 0.00023), new("F4 centred stripline", 0.00074, 0), new("F5 offset stripline in two dielectrics", 0.0013, 3.6e-05), new("F6 offset stripline in three dielectrics", 0.0016, 6.9e-05), new("F7 masked pair", 0.005, 0.0063), new("F8 offset stripline pair", 0.0013, 4.5e-05), new("F9 broadside pair", 0.0021, 5.9e-05), new("a thin stripline", 0.00047, 0), new("b thin stripline pair", 0.0047, 0), new("c thin offset stripline", 0.0003, 0), new("g thin microstrip in air", 0.00059, 0), new("h thick stripline", 0.0036, 0), new("i thin broadside pair", 0.00013, 0), new("j thick microstrip in air", 0.0017, 0)], IsSecondOpinion: false);

    /// <summary>Handbook formulas.</summary>
    public static LineMethod Ipc2141 { get; } = new(
        "ipc-2141", "IPC-2141 handbook",
        "IPC-2141, \"Controlled impedance circuit boards and high-speed logic design\", 1996 (formulas from memory)",
        "single and edge-coupled microstrip and stripline, as fabricators quote them",
        "microstrip 0.1 ≤ w/h ≤ 2, Dk ≤ 15; stripline w/(b−t) ≤ 0.35, t/b ≤ 0.25, centred",
        "none",
        [new("F1 bare microstrip", 0.045, 0.14), new("F2 masked microstrip", 0.15, 0.2), new("F3 embedded microstrip", 0.102, 0.062), new("F7 masked pair", 0.098, 0.23), new("a thin stripline", 0.047, 0), new("b thin stripline pair", 0.031, 0), new("h thick stripline", 0.0037, 0)], IsSecondOpinion: true);

    /// <summary>Dispersion of microstrip.</summary>
    public static LineMethod KirschningJansen1982 { get; } = new(
        "kirschning-jansen-1982", "Kirschning and Jansen 1982",
        "M. Kirschning, R. H. Jansen, \"Accurate model for effective dielectric constant of microstrip with validity up to millimetre-wave frequencies\", Electronics Letters 18, 1982, pp. 272–273",
        "rise of the effective permittivity of surface microstrip with frequency",
        "Dk ≤ 20, 0.1 ≤ w/h ≤ 100, h ≤ 0.13 wavelengths",
        "0.6 %",
        [], IsSecondOpinion: true);

    /// <summary>Conductor loss.</summary>
    public static LineMethod IncrementalInductance { get; } = new(
        "wheeler-1942", "Wheeler 1942",
        "H. A. Wheeler, \"Formulas for the skin effect\", Proc. IRE 30, 1942, pp. 412–424",
        "resistance of traces and planes at high frequencies, from how the inductance answers to receding walls",
        "metal several skin depths thick; below that an interpolation to the d.c. resistance",
        "exact where the skin depth is small",
        [], IsSecondOpinion: false);

    /// <summary>Roughness, saturating.</summary>
    public static LineMethod HammerstadGroisse1999 { get; } = new(
        "hammerstad-groisse-1999", "Hammerstad and Groisse 1999",
        "E. Hammerstad, Ø. Jensen 1980 (above), after S. P. Morgan, \"Effect of surface roughness on eddy current losses at microwave frequencies\", J. Appl. Phys. 20, 1949, pp. 352–362",
        "factor of rough copper on the surface resistance",
        "rms roughness up to about the skin depth; saturates at 2",
        "none",
        [], IsSecondOpinion: false);

    /// <summary>Roughness of stacked spheres.</summary>
    public static LineMethod CannonballHuray { get; } = new(
        "cannonball-huray", "Huray 2009, Simonovich 2015",
        "P. G. Huray, The Foundations of Signal Integrity, Wiley, 2009; L. Simonovich, \"Practical method for modeling conductor surface roughness using close packing of equal spheres\", DesignCon 2015",
        "factor of rough copper on the surface resistance",
        "foils of known ten-point roughness",
        "none",
        [], IsSecondOpinion: true);

    /// <summary>Permittivity and loss tangent over frequency.</summary>
    public static LineMethod WidebandDebye { get; } = new(
        "djordjevic-2001", "Djordjević and others 2001",
        "A. R. Djordjević, R. M. Biljić, V. D. Likar-Smiljanić, T. K. Sarkar, \"Wideband frequency-domain characterization of FR-4 and time-domain causality\", IEEE Trans. EMC 43, 2001, pp. 662–667",
        "Dk and Df of a dielectric at a frequency from their values at another",
        "1 kHz to 1 THz",
        "causal; fits FR-4",
        [], IsSecondOpinion: false);

    /// <summary>All methods, in the order of the geometries.</summary>
    public static ImmutableArray<LineMethod> All { get; } =
    [
        HammerstadJensen1980,
        Wheeler1977,
        Cohn1954,
        Wheeler1978,
        Cohn1955,
        Cohn1960,
        KirschningJansen1984,
        Wen1969,
        GhioneNaldi1983,
        Yamashita1968,
        Ipc2141,
        KirschningJansen1982,
        IncrementalInductance,
        HammerstadGroisse1999,
        CannonballHuray,
        WidebandDebye,
    ];
}
