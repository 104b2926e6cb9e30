using System.Text;
using Swarm.Engine.Models;

namespace Swarm.Engine.Tests.Models;

public class RefusedModelTests
{
    private const string File = "tests/Swarm.Engine.Tests/Data/models/refused.txt";

    [Fact]
    public void Everything_that_is_wrong_is_told_at_its_place()
    {
        string head = System.IO.File.ReadAllText(RepositoryFile.Path(File)).Split("\n=== ")[0];
        StringBuilder told = new(head);
        foreach (RefusedModel refused in RefusedModel.All)
        {
            told.Append($"\n=== {refused.Name} [{refused.Kind}]\n{refused.Text}\n--- told\n");
            told.AppendJoin('\n', Documents.Told(refused.Text).Select(line => line.Replace(Documents.FileName + ":", "", StringComparison.Ordinal)));
        }

        RepositoryFile.AssertIs(told.Append('\n').ToString(), File);
    }

    [Fact]
    public void A_document_with_an_error_gives_no_model()
    {
        foreach (RefusedModel refused in RefusedModel.All)
        {
            ModelReading reading = Documents.Read(refused.Text);

            Assert.True(reading.Model is null, refused.Name);
            Assert.True(reading.Diagnostics.Any(d => d.Severity == Severity.Error), refused.Name);
        }
    }
}
