using FiberScope.Assessment.Measuring;
using Spectre.Console;

namespace FiberScope.Cli.Console;

/// <summary>Shows how far a run has come: a bar on a terminal, nothing in a pipe.</summary>
internal static class ProgressDisplay
{
    /// <summary>Runs work under a progress bar.</summary>
    public static T Run<T>(CommandConsole console, string title, Func<IProgress<RunProgress>?, T> work)
    {
        if (!console.ErrorIsTerminal)
        {
            return work(null);
        }

        return CommandConsole.For(console.Error, isTerminal: true).Progress()
            .AutoClear(true)
            .HideCompleted(true)
            .Columns(new TaskDescriptionColumn { Alignment = Justify.Left }, new ProgressBarColumn(), new PercentageColumn(), new ElapsedTimeColumn())
            .Start(context => work(new Bar(context.AddTask(Markup.Escape(title), maxValue: 1))));
    }

    private sealed class Bar(ProgressTask task) : IProgress<RunProgress>
    {
        public void Report(RunProgress value)
        {
            task.MaxValue = value.Total;
            task.Value = value.Done;
            task.Description = Markup.Escape(value.What);
        }
    }
}
