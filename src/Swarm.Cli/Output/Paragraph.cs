namespace Swarm.Cli.Output;

/// <summary>Running text, broken at spaces.</summary>
internal static class Paragraph
{
    /// <summary>Writes a text with a first line that begins with <paramref name="lead"/> and further lines under its text.</summary>
    public static void Write(TextWriter output, int width, string text, string lead = "")
    {
        var indent = new string(' ', lead.Length);
        var line = lead;
        var isEmpty = true;
        foreach (var word in text.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            if (!isEmpty && line.Length + 1 + word.Length > width)
            {
                output.WriteLine(line);
                (line, isEmpty) = (indent, true);
            }

            line += isEmpty ? word : $" {word}";
            isEmpty = false;
        }

        output.WriteLine(line);
    }
}
