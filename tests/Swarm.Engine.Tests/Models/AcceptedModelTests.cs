using Swarm.Engine.Models;

namespace Swarm.Engine.Tests.Models;

public class AcceptedModelTests
{
    [Fact]
    public void Right_documents_are_read_without_a_word()
    {
        foreach (AcceptedModel accepted in AcceptedModel.All)
        {
            Assert.True(Documents.Told(accepted.Text) is [], $"{accepted.Name}: {string.Join('\n', Documents.Told(accepted.Text))}");
        }
    }

    [Fact]
    public void Line_ends_and_a_byte_order_mark_change_nothing()
    {
        foreach (AcceptedModel accepted in AcceptedModel.All)
        {
            Model unix = Documents.Accepted(accepted.Text);
            Model windows = Documents.Accepted('\uFEFF' + accepted.Text.ReplaceLineEndings("\r\n"));

            Assert.Equal(unix.Formulas, windows.Formulas, (a, b) => a.Name == b.Name && a.Position == b.Position && Prefix.Of(a.Body) == Prefix.Of(b.Body));
            Assert.Equal(unix.Outcomes.Select(o => o.Position), windows.Outcomes.Select(o => o.Position));
        }
    }
}
