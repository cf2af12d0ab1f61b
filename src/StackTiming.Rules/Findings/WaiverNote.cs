using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Findings;

/// <summary>The waiver behind a waived finding.</summary>
/// <param name="Reason">Why the finding is accepted.</param>
/// <param name="ApprovedBy">Role or initials of whoever accepted it.</param>
/// <param name="Until">Last day of its validity, or null where it is not limited.</param>
/// <param name="At">Where it is written.</param>
public sealed record WaiverNote(string Reason, string ApprovedBy, DateOnly? Until, FilePosition At);
