using System.Globalization;

namespace SurveyPlanner.Cli;

/// <summary>Where a command writes: results to <see cref="Out"/>, everything else to <see cref="Error"/>.</summary>
/// <param name="Out">Standard output.</param>
/// <param name="Error">Standard error.</param>
/// <param name="ErrorIsTerminal">Whether a person watches standard error: only then is there a progress bar or colour.</param>
internal sealed record Terminal(TextWriter Out, TextWriter Error, bool ErrorIsTerminal)
{
    private const int BarWidth = 30;

    public static Terminal OfProcess()
    {
        var dumb = Environment.GetEnvironmentVariable("TERM") == "dumb";
        return new Terminal(Console.Out, Console.Error, !Console.IsErrorRedirected && !dumb);
    }

    /// <summary>Colour only where a person looks and NO_COLOR is not set.</summary>
    private bool Colour => ErrorIsTerminal && string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR"));

    public void Warn(string message) => Error.WriteLine(Colour ? $"\e[33mwarning:\e[0m {message}" : $"warning: {message}");

    public void Fail(string message) => Error.WriteLine(Colour ? $"\e[31merror:\e[0m {message}" : $"error: {message}");

    /// <summary>A bar that overwrites itself, or nothing where nobody watches.</summary>
    public IProgress<double>? Progress(string doing) => ErrorIsTerminal ? new Bar(Error, doing) : null;

    private sealed class Bar(TextWriter error, string doing) : IProgress<double>
    {
        public void Report(double value)
        {
            var filled = (int)(Math.Clamp(value, 0, 1) * BarWidth);
            var bar = new string('#', filled) + new string('.', BarWidth - filled);
            error.Write(string.Create(CultureInfo.InvariantCulture, $"\r{doing} [{bar}] {100 * value,3:0} %"));
            if (value >= 1)
            {
                error.Write("\r" + new string(' ', doing.Length + BarWidth + 9) + "\r");
            }
        }
    }
}
