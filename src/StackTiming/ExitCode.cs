namespace StackTiming;

/// <summary>What the process tells its caller.</summary>
public static class ExitCode
{
    /// <summary>All rules hold; waived ones count as holding.</summary>
    public const int Holds = 0;

    /// <summary>A rule fails.</summary>
    public const int RuleFails = 1;

    /// <summary>The input or the command line is wrong.</summary>
    public const int WrongInput = 2;

    /// <summary>The program failed.</summary>
    public const int ProgramFailed = 3;

    /// <summary>Interrupted from the keyboard or by a request to end.</summary>
    public const int Interrupted = 130;
}
