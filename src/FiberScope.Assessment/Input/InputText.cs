using System.Security.Cryptography;
using System.Text;
using YamlDotNet.Core;
using YamlDotNet.RepresentationModel;

namespace FiberScope.Assessment.Input;

/// <summary>A YAML file being read, and the problems found in it so far.</summary>
internal sealed class InputText
{
    private readonly List<InputProblem> _problems = [];

    public InputText(string name, string text)
    {
        Name = name;
        Text = text;
        Sha256 = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text)));
        Root = Parse();
    }

    public string Name { get; }

    public string Text { get; }

    /// <summary>SHA-256 of the text in UTF-8; 64 lower-case hexadecimal digits.</summary>
    public string Sha256 { get; }

    /// <summary>The top mapping.</summary>
    public YamlMappingNode Root { get; }

    /// <summary>Reads a file from disk.</summary>
    /// <exception cref="InputException">The file is missing, cannot be read, or is no YAML mapping.</exception>
    /// <param name="path">Where the file is.</param>
    /// <param name="name">What to call it in messages; the path when null.</param>
    public static InputText FromFile(string path, string? name = null)
    {
        name ??= path;
        try
        {
            return new InputText(name, File.ReadAllText(path));
        }
        catch (Exception e) when (e is FileNotFoundException or DirectoryNotFoundException)
        {
            throw new InputException([new InputProblem(name, 0, Directory.Exists(path) ? "is a folder; name the YAML file in it" : "no such file")]);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new InputException([new InputProblem(name, 0, Directory.Exists(path) ? "is a folder; name the YAML file in it" : "cannot be read: " + FirstLine(e.Message))]);
        }
    }

    public void Report(YamlNode at, string message) => Report((int)at.Start.Line, message);

    public void Report(int line, string message) => _problems.Add(new InputProblem(Name, line, message));

    public void Report(IEnumerable<InputProblem> problems) => _problems.AddRange(problems);

    /// <exception cref="InputException">Problems were reported.</exception>
    public void ThrowIfProblems()
    {
        if (_problems.Count > 0)
        {
            throw new InputException(_problems.OrderBy(p => p.File != Name).ThenBy(p => p.Line));
        }
    }

    private static string FirstLine(string message) => message.Split('\n')[0].TrimEnd();

    private YamlMappingNode Parse()
    {
        var stream = new YamlStream();
        var scanner = new Scanner(new StringReader(Text));
        try
        {
            stream.Load(new Parser(scanner));
        }
        catch (YamlException e)
        {
            throw Single((int)e.Start.Line, "not valid YAML: " + Words(e));
        }
        catch (InvalidOperationException)
        {
            // Some broken flow collections trip the scanner itself, which then tells no place of its own.
            throw Single((int)scanner.CurrentPosition.Line, "not valid YAML: the structure cannot be read here");
        }

        if (stream.Documents.Count > 1)
        {
            throw Single((int)stream.Documents[1].RootNode.Start.Line, "holds more than one YAML document; keep one per file");
        }

        return stream.Documents.Count == 1 && stream.Documents[0].RootNode is YamlMappingNode map
            ? map
            : throw Single(1, "must hold keys with values, such as 'basis_weight: 25 g/m2'");
    }

    private static string Words(YamlException e)
    {
        var message = FirstLine((e.InnerException ?? e).Message).TrimEnd('.');
        return message.Length == 0 ? "the structure cannot be read here" : char.ToLowerInvariant(message[0]) + message[1..];
    }

    private InputException Single(int line, string message) => new([new InputProblem(Name, line, message)]);
}
