namespace StackTiming.Lines.Methods;

/// <summary>A published method, as <c>stacktiming methods</c> lists it and reports quote it.</summary>
/// <param name="Id">Short id that results carry, such as <c>hammerstad-jensen-1980</c>.</param>
/// <param name="Name">Name, such as <c>Hammerstad and Jensen 1980</c>.</param>
/// <param name="Source">Full reference.</param>
/// <param name="Geometry">What it computes.</param>
/// <param name="Validity">Validity range, in words.</param>
/// <param name="StatedError">What the authors say of its accuracy.</param>
/// <param name="Measured">What this project's tests measure against the independent references, largest first; empty for a method without a reference.</param>
/// <param name="IsSecondOpinion">True where the method is only shown beside a better one.</param>
public sealed record LineMethod(
    string Id, string Name, string Source, string Geometry, string Validity, string StatedError,
    IReadOnlyList<MeasuredError> Measured, bool IsSecondOpinion);

/// <summary>The largest error of a method against one set of independent reference cases. A test recomputes it.</summary>
/// <param name="CaseSet">Name of the case set, such as <c>F1 bare microstrip</c>.</param>
/// <param name="ImpedanceError">Largest relative error of an impedance.</param>
/// <param name="EpsEffError">Largest relative error of an effective permittivity.</param>
public readonly record struct MeasuredError(string CaseSet, double ImpedanceError, double EpsEffError);
