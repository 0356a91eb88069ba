using System.CommandLine;
using System.Reflection;
using Auditor.Yaml;

namespace Auditor.Cli;

/// <summary>The commands and their options, as one table; what they do is elsewhere.</summary>
internal sealed class CommandLine
{
    private const string Program = "run-audit.sh";

    private readonly Argument<string?> _declaration = new("DECLARATION.yaml")
    {
        Description = "The declaration of one model.",
        Arity = ArgumentArity.ZeroOrOne,
    };

    private readonly AuditOptions _rootOptions = new();
    private readonly AuditOptions _demoOptions = new();
    private readonly RuleOptions _ruleOptions = new();
    private readonly Command _demo = new("demo", "Audit the bundled demo and say where the report is.");
    private readonly Command _new = new("new", "Write a commented first declaration for a data file.");
    private readonly Argument<string> _data = new("DATA") { Description = "The data file." };
    private readonly Option<string?> _response = Options.Text("--response", "COLUMN", "The column that the model explains.");
    private readonly Option<string?> _newFile = Options.Text("--out", "FILE", "Where to write it (default: NAME.yaml here); never over a file that is there.");
    private readonly Command _rules = new("rules", "List the rules and facts, or explain one.");
    private readonly Argument<string?> _ruleId = new("ID") { Description = "The rule or fact to explain.", Arity = ArgumentArity.ZeroOrOne };
    private readonly Command _selfTest = new("self-test", "Certified and reference cases on this machine; writes self-test.json and self-test.html.");
    private readonly Option<string?> _selfTestOut = new("--out") { HelpName = "DIR", Description = "Folder for the evidence (default: ./audit-out)." };
    private readonly RootCommand _root = new("Audits a declared regression model and the terms it left out, from its data.");

    private CommandLine()
    {
        _root.Arguments.Add(_declaration);
        _rootOptions.AddTo(_root);
        _demoOptions.AddTo(_demo);
        _root.SetAction(_ => ExitStatus.Audited); // The parser wants one; what runs is decided in Run.
        _response.Required = true;
        _new.Arguments.Add(_data);
        _new.Options.Add(_response);
        _new.Options.Add(_newFile);
        _rules.Arguments.Add(_ruleId);
        foreach (var option in _ruleOptions.All)
        {
            _rules.Options.Add(option);
        }

        _selfTest.Options.Add(_selfTestOut);
        foreach (var command in new[] { _demo, _new, _rules, _selfTest })
        {
            _root.Subcommands.Add(command);
        }
    }

    /// <summary>The version that stands in every record.</summary>
    public static string Version => typeof(CommandLine).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()!.InformationalVersion;

    public static int Run(string[] args) => new CommandLine().Dispatch(args);

    private int Dispatch(string[] args)
    {
        if (args is ["--version"])
        {
            Console.Out.WriteLine(Version);
            return ExitStatus.Audited;
        }

        var parsed = _root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (args.Any(arg => arg is "--help" or "-h" or "-?"))
        {
            return Help(parsed);
        }

        var misfits = (Misplaced(args, parsed) ?? Misspelt(parsed)) is string wrong ? [wrong] : UnknownWords.In(parsed, parsed.GetValue(_declaration));
        return misfits.Count > 0 ? Unusable(misfits) : Run(parsed);
    }

    private int Run(ParseResult parsed)
    {
        var command = parsed.CommandResult.Command;
        if (command == _demo)
        {
            return AuditOne(parsed, _demoOptions, BundledFiles.DemoDeclaration, DefaultOut);
        }

        if (command == _rules)
        {
            return RulesCommand.Run(parsed.GetValue(_ruleId), _ruleOptions.Folder(parsed), _ruleOptions.PolicyFile(parsed));
        }

        if (command == _selfTest)
        {
            return SelfTest(parsed.GetValue(_selfTestOut) ?? DefaultOut);
        }

        if (command == _new)
        {
            return NewCommand.Run(parsed.GetValue(_data)!, parsed.GetValue(_response)!, parsed.GetValue(_newFile));
        }

        var declaration = parsed.GetValue(_declaration);
        if (string.IsNullOrEmpty(declaration))
        {
            return Unusable(["name a declaration, or say demo"]);
        }

        var folder = Path.GetDirectoryName(Path.GetFullPath(declaration)) ?? Environment.CurrentDirectory;
        return AuditOne(parsed, _rootOptions, declaration, Path.Combine(folder, "audit-out"));
    }

    private static int SelfTest(string output)
    {
        var problems = new List<string>();
        var moment = Clock.Now(problems);
        return problems.Count > 0 ? Unusable(problems) : SelfTestCommand.Run(BundledFiles.SelfTestCases, output, moment);
    }

    private static string DefaultOut => Path.Combine(Environment.CurrentDirectory, "audit-out");

    private static int AuditOne(ParseResult parsed, AuditOptions options, string declaration, string defaultOut)
    {
        var problems = new List<string>();
        return options.Read(parsed, declaration, defaultOut, problems) is { } request ? AuditCommand.Run(request) : Unusable(problems);
    }

    /// <summary>The parser names the program after its file; people start it by the script's name.</summary>
    private int Help(ParseResult parsed)
    {
        var text = new StringWriter(System.Globalization.CultureInfo.InvariantCulture);
        var status = parsed.Invoke(new InvocationConfiguration { EnableDefaultExceptionHandler = false, Output = text });
        Console.Out.Write(text.ToString().Replace("  " + _root.Name + " ", "  ./" + Program + " ", StringComparison.Ordinal));
        return status;
    }

    /// <summary>An option or file before a command would be dropped in silence: options stand after the word they belong to.</summary>
    private string? Misplaced(string[] args, ParseResult parsed) =>
        parsed.CommandResult.Command is var command && command != _root && args[0] != command.Name
            ? $"'{args[0]}' stands before '{command.Name}'; options stand after the word they belong to"
            : null;

    /// <summary>What is taken for a declaration because no command is called so.</summary>
    private string? Misspelt(ParseResult parsed) =>
        parsed.CommandResult.Command == _root
        && parsed.GetValue(_declaration) is { } word
        && !Path.Exists(word)
        && NearestName.Of(word, _root.Subcommands.Select(command => command.Name)) is { } near
            ? $"'{word}' is no command, and no file has that name; did you mean '{near}'?"
            : null;

    private static int Unusable(IEnumerable<string> problems)
    {
        foreach (var problem in problems)
        {
            Console.Error.WriteLine("error: " + problem);
        }

        Console.Error.WriteLine($"See {Program} --help.");
        return ExitStatus.Unusable;
    }
}
