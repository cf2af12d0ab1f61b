using StackTiming.Rules.Findings;

namespace StackTiming.Rules.Results;

/// <summary>How many findings of each outcome a check has.</summary>
/// <param name="Passed">Findings that hold.</param>
/// <param name="FailedMust">Failed findings of <c>must</c> rules.</param>
/// <param name="FailedShould">Failed findings of <c>should</c> rules.</param>
/// <param name="Waived">Findings accepted by a waiver.</param>
/// <param name="UncheckedMust">Findings of <c>must</c> rules that could not be judged.</param>
/// <param name="UncheckedShould">Findings of <c>should</c> rules that could not be judged.</param>
public readonly record struct FindingCounts(
    int Passed, int FailedMust, int FailedShould, int Waived, int UncheckedMust, int UncheckedShould)
{
    /// <summary>Failed findings of either severity.</summary>
    public int Failed => FailedMust + FailedShould;

    /// <summary>Unchecked findings of either severity.</summary>
    public int Unchecked => UncheckedMust + UncheckedShould;

    /// <summary>All findings.</summary>
    public int Total => Passed + Failed + Waived + Unchecked;

    /// <summary>The verdict that follows: pass where no <c>must</c> finding is failed or unchecked.</summary>
    public Verdict Verdict => FailedMust + UncheckedMust == 0 ? Verdict.Pass : Verdict.Fail;

    /// <summary>Counts findings.</summary>
    /// <param name="findings">The findings.</param>
    public static FindingCounts Of(IEnumerable<Finding> findings)
    {
        int passed = 0, failedMust = 0, failedShould = 0, waived = 0, uncheckedMust = 0, uncheckedShould = 0;
        foreach (var finding in findings)
        {
            var must = finding.Severity == Severity.Must;
            switch (finding.Status)
            {
                case FindingStatus.Pass:
                    passed++;
                    break;
                case FindingStatus.Waived:
                    waived++;
                    break;
                case FindingStatus.Fail when must:
                    failedMust++;
                    break;
                case FindingStatus.Fail:
                    failedShould++;
                    break;
                case FindingStatus.Unchecked when must:
                    uncheckedMust++;
                    break;
                default:
                    uncheckedShould++;
                    break;
            }
        }
        return new FindingCounts(passed, failedMust, failedShould, waived, uncheckedMust, uncheckedShould);
    }
}
