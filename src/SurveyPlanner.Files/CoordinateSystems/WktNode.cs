using System.Globalization;
using System.Text;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>One bracket of well-known text: a keyword, its texts, numbers and inner brackets in order.</summary>
internal sealed class WktNode(string keyword)
{
    // The deepest real text has six levels; longer texts than this are no coordinate systems.
    private const int MostLevels = 20;
    private const int MostCharacters = 50_000;

    private readonly List<object> _values = [];

    public string Keyword { get; } = keyword;

    /// <summary>Inner brackets.</summary>
    public IEnumerable<WktNode> Nodes => _values.OfType<WktNode>();

    /// <summary>The first text, which is the name.</summary>
    public string Name => _values.OfType<string>().FirstOrDefault() ?? "";

    public IReadOnlyList<string> Texts => [.. _values.OfType<string>()];

    public IReadOnlyList<double> Numbers => [.. _values.OfType<double>()];

    /// <summary>The first number, null if there is none.</summary>
    public double? Number => Numbers is [var first, ..] ? first : null;

    public WktNode? Find(params string[] keywords) => Nodes.FirstOrDefault(node => keywords.Contains(node.Keyword));

    /// <summary>Reads a text; throws <see cref="FormatException"/> with what is wrong, and at which character.</summary>
    public static WktNode Parse(string text)
    {
        if (text.Length > MostCharacters)
        {
            throw new FormatException($"it is longer than {MostCharacters} characters");
        }

        var parser = new Parser(text.Trim('\uFEFF', ' ', '\r', '\n', '\t', '\0'));
        return parser.ParseWhole();
    }

    private sealed class Parser(string text)
    {
        private int _at;

        public WktNode ParseWhole()
        {
            var keyword = Word();
            if (keyword.Length == 0 || Peek() is not ('[' or '('))
            {
                throw Fault("it does not begin with a keyword and a bracket");
            }

            var node = Node(keyword, 1);
            return Peek() == '\0' ? node : throw Fault("something follows its last bracket");
        }

        private WktNode Node(string keyword, int level)
        {
            if (level > MostLevels)
            {
                throw Fault("its brackets are nested too deep");
            }

            var close = text[_at++] == '[' ? ']' : ')';
            var node = new WktNode(keyword.ToUpperInvariant());
            while (true)
            {
                node._values.Add(Value(level));
                var next = Peek();
                _at++;
                if (next == close)
                {
                    return node;
                }

                if (next != ',')
                {
                    _at--;
                    throw Fault(next == '\0' ? "it is cut short" : $"'{close}' or a comma was expected");
                }
            }
        }

        private object Value(int level)
        {
            var c = Peek();
            if (c == '"')
            {
                return Quoted();
            }

            if (char.IsAsciiLetter(c))
            {
                var word = Word();
                return Peek() is '[' or '(' ? Node(word, level + 1) : word;
            }

            return c == '\0' ? throw Fault("it is cut short") : Number();
        }

        private string Quoted()
        {
            var value = new StringBuilder();
            for (_at++; _at < text.Length; _at++)
            {
                if (text[_at] != '"')
                {
                    value.Append(text[_at]);
                }
                else if (_at + 1 < text.Length && text[_at + 1] == '"')
                {
                    value.Append(text[_at++]);
                }
                else
                {
                    _at++;
                    return value.ToString();
                }
            }

            throw Fault("it is cut short");
        }

        private double Number()
        {
            var start = _at;
            while (_at < text.Length && (char.IsAsciiLetterOrDigit(text[_at]) || text[_at] is '.' or '+' or '-'))
            {
                _at++;
            }

            return double.TryParse(text.AsSpan(start, _at - start), NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value)
                ? value
                : throw Fault("a number was expected");
        }

        private string Word()
        {
            Peek();
            var start = _at;
            while (_at < text.Length && (char.IsAsciiLetterOrDigit(text[_at]) || text[_at] == '_'))
            {
                _at++;
            }

            return text[start.._at];
        }

        /// <summary>The next character that is no space; NUL at the end.</summary>
        private char Peek()
        {
            while (_at < text.Length && char.IsWhiteSpace(text[_at]))
            {
                _at++;
            }

            return _at < text.Length ? text[_at] : '\0';
        }

        private FormatException Fault(string what) => new(string.Create(CultureInfo.InvariantCulture, $"{what} (character {_at + 1})"));
    }
}
