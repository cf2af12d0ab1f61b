namespace StackTiming.Stackups.Reading;

/// <summary>
/// Collects the problems of the files of one run. A file with thousands of problems keeps only the first of them and a count, so that
/// hostile input cannot exhaust the memory.
/// </summary>
public sealed class ProblemList
{
    /// <summary>How many problems are kept.</summary>
    public const int Capacity = 200;

    // Readers shorten what they quote; this bound holds for what they forget.
    private const int LongestText = 1000;

    private readonly List<Problem> problems = [];

    /// <summary>The problems kept, in the order in which they were found.</summary>
    public IReadOnlyList<Problem> Items => problems;

    /// <summary>Number of problems found beyond <see cref="Capacity"/>.</summary>
    public int Omitted { get; private set; }

    /// <summary>True where further problems are only counted, so that nobody need word them with care.</summary>
    public bool IsFull => problems.Count >= Capacity;

    /// <summary>Number of errors found so far, kept or not; a reader compares it before and after to know whether its own part was whole.</summary>
    public int ErrorCount { get; private set; }

    /// <summary>True where at least one error was found.</summary>
    public bool HasErrors => ErrorCount > 0;

    /// <summary>Adds an error: the file cannot be used as it is.</summary>
    /// <param name="at">Where.</param>
    /// <param name="message">What is wrong.</param>
    /// <param name="advice">What to write instead.</param>
    public void Error(FilePosition at, string message, string? advice = null)
    {
        ErrorCount++;
        Keep(new Problem(at, message, advice, IsError: true));
    }

    /// <summary>Adds a note: the run goes on.</summary>
    /// <param name="at">Where.</param>
    /// <param name="message">What the author should know.</param>
    /// <param name="advice">What to do about it.</param>
    public void Note(FilePosition at, string message, string? advice = null) =>
        Keep(new Problem(at, message, advice, IsError: false));

    private void Keep(Problem problem)
    {
        if (IsFull)
        {
            Omitted++;
            return;
        }
        problems.Add(problem with
        {
            Message = ProblemText.Cut(problem.Message, LongestText),
            Advice = problem.Advice is { } advice ? ProblemText.Cut(advice, LongestText) : null,
        });
    }
}
