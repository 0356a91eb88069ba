namespace Auditor.Numerics; internal static class Placeholder { }
