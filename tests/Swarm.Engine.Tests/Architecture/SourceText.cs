using System.Text;
using System.Text.RegularExpressions;

namespace Swarm.Engine.Tests.Architecture;

/// <summary>What a C# source says once comments and literals are taken away.</summary>
internal static partial class SourceText
{
    /// <summary>Words of the code.</summary>
    public static IEnumerable<string> CodeWords(string source) => Word().Matches(Code(source)).Select(match => match.Value);

    /// <summary>The code with comments and literals blanked, line for line.</summary>
    public static string Code(string source) => CommentOrLiteral().Replace(source, match => Blank(match.Value));

    /// <summary>Methods of a source whose body in braces has more lines than the limit, as "line n: m lines".</summary>
    public static IEnumerable<string> MethodsLongerThan(int limit, string source)
    {
        string[] lines = Code(source).ReplaceLineEndings("\n").Split('\n');
        var open = new Stack<(int Line, bool IsMethod)>();
        var declaration = new StringBuilder();
        for (int line = 0; line < lines.Length; line++)
        {
            foreach (char letter in lines[line])
            {
                if (letter == '{')
                {
                    open.Push((line, IsMethod(declaration.ToString(), open)));
                    declaration.Clear();
                }
                else if (letter == '}' && open.TryPop(out (int Line, bool IsMethod) block))
                {
                    int length = line - block.Line + 1;
                    if (block.IsMethod && length > limit)
                    {
                        yield return $"line {block.Line + 1}: {length} lines";
                    }

                    declaration.Clear();
                }
                else if (letter == ';')
                {
                    declaration.Clear();
                }
                else
                {
                    declaration.Append(letter);
                }
            }

            declaration.Append(' ');
        }
    }

    // A block is a method's when it opens directly in a type and its declaration has a parameter list.
    private static bool IsMethod(string declaration, Stack<(int Line, bool IsMethod)> open) =>
        !open.Any(block => block.IsMethod) && declaration.Contains('(') && !TypeDeclaration().IsMatch(declaration);

    private static string Blank(string text) => string.Concat(text.Select(letter => letter == '\n' ? '\n' : ' '));

    [GeneratedRegex(
        """
        //[^\n]*
        | /\*.*?\*/
        | \$*"{3,} .*? "{3,}
        | \$?@\$?"(?:[^"]|"")*"
        | \$?"(?:\\.|[^"\\\n])*"
        | '(?:\\.[^'\n]*|[^'\\\n])'
        """,
        RegexOptions.Singleline | RegexOptions.IgnorePatternWhitespace)]
    private static partial Regex CommentOrLiteral();

    [GeneratedRegex(@"\b(?:class|struct|record|interface|enum|namespace)\s+(?!where\b)\w")]
    private static partial Regex TypeDeclaration();

    [GeneratedRegex(@"\b[A-Za-z_]\w*")]
    private static partial Regex Word();
}
