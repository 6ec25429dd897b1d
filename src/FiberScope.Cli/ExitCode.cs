namespace FiberScope.Cli;

/// <summary>What the program tells the caller when it ends.</summary>
public static class ExitCode
{
    /// <summary>All went well; a verdict, whatever it is, does not change this unless asked for.</summary>
    public const int Done = 0;

    /// <summary>Asked to tell the verdict by exit code: a limit of the grade is broken.</summary>
    public const int VerdictFail = 1;

    /// <summary>The input is wrong; nothing was written.</summary>
    public const int BadInput = 2;

    /// <summary>The output cannot be written.</summary>
    public const int NotWritable = 3;

    /// <summary>The native image library is missing.</summary>
    public const int NativeLibraryMissing = 4;

    /// <summary>Asked to tell the verdict by exit code: it is undecided.</summary>
    public const int VerdictUndecided = 5;

    /// <summary>A fault of the program itself (EX_SOFTWARE of the BSD sysexits list).</summary>
    public const int OwnFault = 70;

    /// <summary>Stopped by Ctrl-C; nothing was written.</summary>
    public const int Cancelled = 130;
}
