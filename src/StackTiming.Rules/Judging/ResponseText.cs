namespace StackTiming.Rules.Judging;

/// <summary>How findings name the way to a waveform.</summary>
internal static class ResponseText
{
    public static string Method(IBoardPhysics board) => $"lossless waves, method of characteristics; lines by {board.CalculatorName}";
}
