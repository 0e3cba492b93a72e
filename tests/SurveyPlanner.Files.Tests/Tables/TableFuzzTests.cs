using System.Text;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Tables;

/// <summary>Whatever the table, it is read or refused with places; nothing else.</summary>
public sealed class TableFuzzTests : IDisposable
{
    private const string Transects = """"
        stratum,transect,length_km,count
        inner bay,A1,2.5,3
        "outer, sound",A2,1e1,0
        "outer, sound","A ""3""",4.75,12

        """";

    private readonly string path = Path.GetTempFileName();

    public void Dispose() => File.Delete(path);

    [Fact]
    public void A_damaged_table_is_read_or_refused_with_lines()
        => Mutations.Of(Transects).Hold(
            1000, seed: 1,
            text =>
            {
                // The text as a file holds it: half surrogate pairs cannot be written.
                File.WriteAllBytes(path, Encoding.UTF8.GetBytes(text));
                try
                {
                    var pilot = PilotTableReader.Read(path, null);
                    Assert.All(pilot.Transects, transect => Assert.True(transect is { Effort: > 0, Count: >= 0, Id.Length: > 0 } && double.IsFinite(transect.Effort)));
                }
                catch (InputException exception)
                {
                    Assert.NotEmpty(exception.Problems);
                    Assert.All(exception.Problems, problem =>
                    {
                        Assert.InRange(problem.Line!.Value, 1, text.Count(c => c is '\n' or '\r') + 1);
                        Assert.DoesNotContain(problem.ToString(), char.IsControl);
                        Assert.InRange(problem.Message.Length, 5, 300);
                    });
                }
            });
}
