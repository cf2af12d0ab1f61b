namespace StackTiming.Lines.Layered;

/// <summary>A horizontal strip without thickness that carries charge: a face of a conductor or a stand-in for its side walls.</summary>
/// <param name="Conductor">Index of the conductor that it belongs to.</param>
/// <param name="Node">Index of the layer whose upper face it lies on.</param>
/// <param name="CentreMetres">x of its centre, metres.</param>
/// <param name="HalfWidthMetres">Half of its width, metres.</param>
/// <param name="Terms">Number of terms of its charge.</param>
internal readonly record struct ThinStrip(int Conductor, int Node, double CentreMetres, double HalfWidthMetres, int Terms);
