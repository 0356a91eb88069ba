namespace Auditor; internal static class Placeholder { }
