using Spectre.Console;

namespace Auditor.Cli;

/// <summary>One line on the terminal's standard error that is rewritten while work lasts, then gone. Its library is loaded only when there is one.</summary>
internal static class TerminalLine
{
    public static T While<T>(Func<Action<string>, T> work)
    {
        var console = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(Console.Error) });
        return console.Status().Spinner(Spinner.Known.Line).Start("Starting", status => work(line => status.Status(Markup.Escape(line))));
    }
}
