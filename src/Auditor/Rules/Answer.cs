namespace Auditor.Rules;

/// <summary>What a condition, or a whole rule, says of one subject.</summary>
/// <param name="Holds">Null when it could not be decided.</param>
/// <param name="Why">The reasons, when it could not.</param>
public readonly record struct Answer(bool? Holds, string? Why)
{
    public static Answer Of(bool holds) => new(holds, null);

    public static Answer Undecided(string why) => new(null, why);

    /// <summary>False as soon as one is false, whatever could not be computed; else undecided when one is; else true.</summary>
    public static Answer All(IEnumerable<Answer> answers) => Join([.. answers], decisive: false);

    /// <summary>True as soon as one is true, whatever could not be computed; else undecided when one is; else false.</summary>
    public static Answer Any(IEnumerable<Answer> answers) => Join([.. answers], decisive: true);

    private static Answer Join(List<Answer> answers, bool decisive)
    {
        if (answers.Any(answer => answer.Holds == decisive))
        {
            return Of(decisive);
        }

        var reasons = answers.Where(answer => answer.Holds is null).Select(answer => answer.Why).Distinct().ToList();
        return reasons.Count == 0 ? Of(!decisive) : Undecided(string.Join("; ", reasons));
    }
}
