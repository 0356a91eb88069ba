using System.Globalization;

namespace Auditor.Tests;

/// <summary>Runs something on a thread of its own under another culture.</summary>
internal static class Cultures
{
    public static T In<T>(string name, Func<T> work)
    {
        T? result = default;
        var thread = new Thread(() => result = work()) { CurrentCulture = new CultureInfo(name), CurrentUICulture = new CultureInfo(name) };
        thread.Start();
        thread.Join();
        return result!;
    }
}
