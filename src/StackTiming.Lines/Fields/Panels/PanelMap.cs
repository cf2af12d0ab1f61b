namespace StackTiming.Lines.Fields.Panels;

/// <summary>
/// How the parameter u (0 to 1) of a panel runs along its straight line, measured from the panel's origin. The charge per u is
/// a polynomial; the map gives the charge per metre the growth that fields have at corners and edges. The number is the power of u.
/// </summary>
internal enum PanelMap
{
    /// <summary>s = X/u: from X to infinity, for charge that falls off as inverse powers of the distance.</summary>
    Infinite = -1,

    /// <summary>s = length·u: smooth charge.</summary>
    Straight = 1,

    /// <summary>s = length·u²: the edge of a strip at u = 0.</summary>
    Square = 2,

    /// <summary>s = length·u³: a corner at u = 0.</summary>
    Cube = 3,
}
