namespace StackTiming.Lines.Fields;

/// <summary>
/// A cross-section that has no quasi-static solution, such as one whose signal touches a plane, or one that is finer than the
/// field solver follows. The message says what is wrong and with which conductor or layer.
/// </summary>
public sealed class SectionNotSolvableException : Exception
{
    /// <summary>Creates the exception with a message that names the conductor or layer and the fault.</summary>
    public SectionNotSolvableException(string message)
        : base(message)
    {
    }

    /// <summary>Creates an exception that says only that a section cannot be solved.</summary>
    public SectionNotSolvableException()
        : base("The cross-section cannot be solved.")
    {
    }

    /// <summary>Creates the exception with a message and the fault that led to it.</summary>
    public SectionNotSolvableException(string message, Exception innerException)
        : base(message, innerException)
    {
    }
}
