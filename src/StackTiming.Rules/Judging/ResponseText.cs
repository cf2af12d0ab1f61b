namespace StackTiming.Rules.Judging;

/// <summary>How findings name the way to a waveform.</summary>
internal static class ResponseText
{
    /// <summary>Share of the swing that margins to a threshold are ranked against at least.</summary>
    public const double RankShare = 0.1;

    public static string Method(IBoardPhysics board) => $"lossless waves, method of characteristics; lines by {board.CalculatorName}";
}
