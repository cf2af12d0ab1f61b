using System.Collections.Immutable;

namespace StackTiming.Lines.Methods;

/// <summary>Every published method of the project, with what the tests measured of it.</summary>
public static class MethodCatalogue
{
    /// <summary>Surface microstrip.</summary>
    public static LineMethod HammerstadJensen1980 { get; } = new(
        "hammerstad-jensen-1980", "Hammerstad and Jensen 1980",
        "E. Hammerstad, Ø. Jensen, \"Accurate models for microstrip computer-aided design\", IEEE MTT-S Int. Microwave Symposium Digest, 1980, pp. 407–409",
        "one bare trace on one dielectric over a plane; a trapezoid counts as the rectangle of the same area",
        "0.01 ≤ w/h ≤ 100, Dk ≤ 128, t ≤ w",
        "thin strip: 0.03 % of the impedance in air, 0.2 % of the effective permittivity",
        [], IsSecondOpinion: false);

    /// <summary>Thin centred stripline.</summary>
    public static LineMethod Cohn1954 { get; } = new(
        "cohn-1954", "Cohn 1954",
        "S. B. Cohn, \"Characteristic impedance of the shielded-strip transmission line\", IRE Trans. MTT-2, 1954, pp. 52–57",
        "one strip without thickness midway between two planes in one dielectric",
        "any w/b, t = 0",
        "exact",
        [], IsSecondOpinion: false);

    /// <summary>Everything in flat layers over a plane or between two.</summary>
    public static LineMethod Yamashita1968 { get; } = new(
        "yamashita-1968", "Yamashita 1968",
        "E. Yamashita, R. Mittra, \"Variational method for the analysis of microstrip lines\", IEEE Trans. MTT-16, 1968, pp. 251–256; E. Yamashita, \"Variational "
        + "method for the analysis of microstrip-like transmission lines\", ibid., pp. 529–535",
        "any traces over a plane or between two planes in flat dielectrics: masked, embedded, offset, coupled, broadside, with coplanar pours; a trapezoid is three strips",
        "t ≤ 0.8·w, gaps ≥ 0.5·t; mask fitted for traces 25 to 60 µm thick",
        "none for thick traces",
        [], IsSecondOpinion: false);

    /// <summary>All methods, in the order of the geometries.</summary>
    public static ImmutableArray<LineMethod> All { get; } = [HammerstadJensen1980, Cohn1954, Yamashita1968];
}
