namespace StackTiming.Lines.Fields.Panels;

/// <summary>How finely a mesh resolves the charge.</summary>
/// <param name="CornerEllipse">A panel that ends at a corner is divided while a foreign corner lies inside this Bernstein ellipse.</param>
/// <param name="SmoothEllipse">Any other panel is divided while a corner lies inside this Bernstein ellipse.</param>
/// <param name="Digits">Decimal digits aimed at in the charge of a panel; sets the number of its polynomials.</param>
/// <param name="Fewest">Fewest polynomials of a panel.</param>
/// <param name="Most">Most polynomials of a panel.</param>
internal readonly record struct PanelDegrees(double CornerEllipse, double SmoothEllipse, double Digits, int Fewest, int Most)
{
    /// <summary>See <see cref="Panel.Ellipse"/>.</summary>
    public double SmallestEllipse(Panel panel) => panel.Map is PanelMap.Square or PanelMap.Cube ? CornerEllipse : SmoothEllipse;

    /// <summary>Number of polynomials of a panel whose nearest foreign corner lies on this ellipse.</summary>
    public int Terms(Panel panel, double ellipse)
    {
        var terms = double.IsPositiveInfinity(ellipse) ? Fewest : (int)Math.Ceiling(Digits / Math.Log10(ellipse));
        return Math.Clamp(terms, Fewest + (panel.Map == PanelMap.Cube ? 1 : 0), Most);
    }
}
