using StackTiming.Lines.Methods;
using Xunit;

namespace StackTiming.Lines.Tests.Methods;

public sealed class MethodCatalogueTests
{
    public static TheoryData<string> Forms() => [.. ClosedForms.InOrderOfPreference.Select(f => f.Method.Id)];

    [Theory]
    [MemberData(nameof(Forms))]
    public void Recorded_errors_are_those_measured_against_the_references_inside_the_validity_range(string id)
    {
        var form = ClosedForms.InOrderOfPreference.Single(f => f.Method.Id == id);
        var measured = Measure(form);

        Assert.Equal(measured.Keys.Order(), form.Method.Measured.Select(m => Family(m.CaseSet)).Order());
        foreach (var recorded in form.Method.Measured)
        {
            var (impedance, epsEff) = measured[Family(recorded.CaseSet)];
            AssertRecorded(recorded.CaseSet + " impedance", recorded.ImpedanceError, impedance);
            AssertRecorded(recorded.CaseSet + " permittivity", recorded.EpsEffError, epsEff);
        }
    }

    [Fact]
    public void Every_method_has_its_own_id_and_says_where_it_comes_from()
    {
        Assert.Equal(MethodCatalogue.All.Length, MethodCatalogue.All.Select(m => m.Id).Distinct().Count());
        Assert.All(MethodCatalogue.All, m => Assert.Matches("(19|20)[0-9]{2}", m.Source));
        Assert.All(ClosedForms.InOrderOfPreference, f => Assert.Contains(f.Method, MethodCatalogue.All));
    }

    private static Dictionary<string, (double Impedance, double EpsEff)> Measure(IClosedForm form)
    {
        var largest = new Dictionary<string, (double Impedance, double EpsEff)>();
        foreach (var reference in ReferenceSections.All.Where(r => form.Objection(r.Section) is null))
        {
            var solution = form.Calculate(reference.Section);
            if (!solution.Warnings.IsEmpty)
                continue;
            var (impedance, epsEff) = largest.GetValueOrDefault(Family(reference.Name.Replace('_', ' ')));
            foreach (var (what, expected, actual) in ReferenceComparison.Values(reference, solution))
            {
                var error = Math.Abs(actual / expected - 1);
                // Three traces have no impedances of their own: L stands for them, C for the permittivity.
                if (what[0] is 'z' or 'L')
                    impedance = Math.Max(impedance, error);
                else
                    epsEff = Math.Max(epsEff, error);
            }
            largest[Family(reference.Name.Replace('_', ' '))] = (impedance, epsEff);
        }
        return largest;
    }

    private static string Family(string caseSet) => caseSet[..caseSet.IndexOf(' ')];

    private static void AssertRecorded(string what, double recorded, double measured)
    {
        Assert.True(recorded >= measured - 1e-9, $"{what}: the catalogue says {recorded}, but {measured} was measured");
        Assert.True(recorded <= 1.2 * measured + 1.1e-6, $"{what}: the catalogue says {recorded}, far above the {measured} measured");
    }
}
