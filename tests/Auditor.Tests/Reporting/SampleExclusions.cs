using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>
/// Left-out groups of an invented lender of farm machinery. No data stand behind them. F, df, effect sizes and effective rows are made up; p-values, noncentral
/// intervals, power and Holm's adjustment follow from those by R 4.2.2 (pf, uniroot, p.adjust), so that the page shows figures that agree with one another.
/// </summary>
internal static class SampleExclusions
{
    public const string ScriptGroup = "operator training <script>alert('seen')</script>";
    public const string LongGroup = "front loader, cultivator, seed drill and every other attachment that was delivered together with the machine";

    private const string Hc3Reason = "No cluster and no time is declared, and the policy names the HC3 form for that case.";
    private const string NoCluster = "No cluster is declared.";
    private const string NoTime = "No time is declared.";

    public static IReadOnlyList<Exclusion> All { get; } = [Engine(), Warranty(), Owners(), Training(), Attachments(), Telematics()];

    public static Exclusion Jointly { get; } = Tested(
        "all left-out terms", ["engine_hours", "engine_hours^2", "warranty_extension", "owners", "operator_training", "attachment"], 1871, 8, 1853, 24.3360839, 23.0633067,
        new Ftest(12.7825129, 4.91996433e-18), new Ftest(9.94, 1.24183953e-13), new Ftest(8.7, 1.00350508e-11)) with
    {
        P = 1.24183953e-13,
        PAdjusted = 1.24183953e-13,
        PartialRSquared = new(0.0523, 0.0336733301, 0.0658164328, 0.0620313773, 0.1296628457, null),
        EffectiveRows = 700,
        Negligible = new(0.01, 0.9999999825, 0.9999999825, null),
        Power = new(0.4197680911, 0.02155009086, 3991.70178, null),
        Verdict = Verdicts.NotSupported,
        Materiality = Materialities.ShownMaterial,
        Reason = "Taken together, the left-out terms explain part of what the final model leaves over.",
    };

    private static Exclusion Engine() => Tested(
        "engine condition", ["engine_hours", "engine_hours^2"], 2398, 2, 2386, 31.1907692, 30.2176172,
        new Ftest(38.4203138, 3.77848107e-17), new Ftest(29.84, 1.58515997e-13), new Ftest(27.91, 1.04202941e-12)) with
    {
        Because = "Not significant at 5 %.",
        P = 1.58515997e-13,
        PAdjusted = 7.92579987e-13,
        PartialRSquared = new(0.0312, 0.0203418941, 0.0430792281, 0.0185499289, 0.0436804848, null),
        EffectiveRows = 1902,
        Negligible = new(0.01, 0.9993933599, 1, null),
        Power = new(0.9815038721, 0.005071917249, 1204.083299, null),
        Verdict = Verdicts.NotSupported,
        Materiality = Materialities.ShownMaterial,
        Reason = "The test rejects leaving engine condition out, and the effect is larger than the bound below which the policy calls it negligible.",
        InParts =
        [
            new("dealer", Divisions.Segment, [], new(0, null, null, null, null, "dealer has 48 values"), "dealer has 48 values"),
            new(
                "region <i>",
                Divisions.Segment,
                [
                    new("coast & <plain>", 1199, "hc3", new(8.02, 2, 1190, 0.000346915236), 0.00104074571, new(9.81, 2, 1190, 5.94718553e-05), new(0.0162, 0.006, 0.029, 0.005, 0.031, null), null),
                    new("hills", 1178, "hc3", new(17.9, 2, 1169, 2.20185301e-08), 8.80741204e-08, new(21.4, 2, 1169, 7.45062275e-10), new(0.0353, 0.019, 0.054, 0.016, 0.057, null), null),
                    new("marsh", 14, null, null, null, null, new(null, null, null, null, null, "14 rows lie in this part"), "14 rows lie in this part"),
                ],
                new(2, "hc3", new(4.4, 2, 2359, 0.0123782611), 0.0123782611, new(6.3, 2, 2359, 0.00186735041), null),
                null),
        ],
    };

    private static Exclusion Warranty() => Tested(
        "warranty extension", ["warranty_extension"], 1987, 1, 1976, 25.8448951, 25.4313768,
        new Ftest(32.1300813, 1.65387102e-08), new Ftest(24.17, 9.54739144e-07), new Ftest(22.83, 1.89953423e-06)) with
    {
        Because = "Dropped by backward elimination.",
        P = 9.54739144e-07,
        PAdjusted = 3.81895658e-06,
        Selective = new(0.0121, null),
        PartialRSquared = new(0.0160, 0.0080882757, 0.0263687629, 0.0065325559, 0.0258881397, null),
        EffectiveRows = 1622,
        Negligible = new(0.01, 0.8065738725, 1, null),
        Power = new(0.9814999732, 0.004843723624, 952.8234052, null),
        OtherRowSet = new(1871, 31.93, 1, 1860, 1.845638803e-08, Verdicts.NotSupported),
        Verdict = Verdicts.NotSupported,
        Materiality = Materialities.NotShown,
        Reason = "The test rejects leaving warranty extension out; whether the effect is negligible the interval does not settle.",
    };

    private static Exclusion Owners() => Tested(
        "previous owners", ["owners"], 2431, 1, 2420, 31.62, 31.49352,
        new Ftest(9.7188755, 0.00184528047), new Ftest(8.31, 0.00397751504), new Ftest(8.22, 0.00417879938)) with
    {
        Because = "Effect too small to matter.",
        P = 0.00397751504,
        PAdjusted = 0.01193254512,
        PartialRSquared = new(0.0040, 0.0008922049, 0.0092824653, 0.0006926183, 0.0092195148, null),
        EffectiveRows = 2204,
        Negligible = new(0.01, 0.03330138499, 0.13320553996, null),
        Power = new(0.9970787441, 0.003564028, 857.7510546, null),
        Verdict = Verdicts.NotSupported,
        Materiality = Materialities.ShownNegligible,
        Reason = "The test rejects leaving previous owners out, but the whole interval of the effect lies below the bound.",
    };

    private static Exclusion Training() => Tested(
        ScriptGroup, ["operator_training"], 2431, 1, 2420, 31.62, 31.6101978,
        new Ftest(0.7504326341, 0.3864251667), new Ftest(0.612, 0.4341123046), new Ftest(0.611, 0.4344876918)) with
    {
        Because = "Collected for \"new\" leases only & not significant.",
        P = 0.4341123046,
        PAdjusted = 0.4341123046,
        PartialRSquared = new(0.00031, 0, 0.0025894592, 0, 0.0025521485, null),
        EffectiveRows = 2290,
        Negligible = new(0.01, 2.823231435e-05, 0.0001411615718, null),
        Power = new(0.9977976879, 0.003430182407, 825.5385696, null),
        Verdict = Verdicts.Supported,
        Materiality = Materialities.ShownNegligible,
        Reason = "The test does not reject, and an effect as large as the bound is ruled out.",
    };

    private static Exclusion Attachments() => Tested(
        LongGroup, ["attachment", "attachment_value", "delivered_with_loader * delivered_with_cultivator_or_seed_drill"], 2290, 4, 2276, 29.786014, 29.6341053,
        new Ftest(2.916775555, 0.02021826404), new Ftest(1.94, 0.1011692285), new Ftest(1.92, 0.1044225784)) with
    {
        P = 0.1011692285,
        PAdjusted = 0.2023384570,
        PartialRSquared = new(0.0051, 0.0004257257, 0.0095297122, 0, 0.0192810928, null),
        EffectiveRows = 804,
        Negligible = new(0.01, 0.2717785999, 0.8153357997, null),
        Power = new(0.6111399396, 0.01487585317, 3372.504673, null),
        Verdict = Verdicts.Inconclusive,
        Materiality = Materialities.NotShown,
        Reason = "The test does not reject, but the rows are worth too little for this question to rule out an effect as large as the bound.",
        Aliased = [new("attachment = none", "1 * intercept - 1 * attachment = loader - 1 * attachment = cultivator - 1 * attachment = seed drill")],
        NearlyAliased = [new("attachment_value", 4.2)],
    };

    private static Exclusion Telematics()
    {
        const string why = "The group adds no column to the final model: its only column equals region = south.";
        return new Exclusion(
            "telematics", ["telematics_fitted"], 2431, 0, 2421, 31.62, 31.62, NoTests, NotComputed(GroupTestNames, why), "hc3", Hc3Reason,
            null, null, null, null, new(null, why), new(null, null, null, null, null, why), null, new(0.01, null, null, why), new(null, null, null, why), null,
            Verdicts.Untestable, Materialities.NotShown, why, [new("telematics_fitted", "region = south")], [])
        {
            Because = "Same information as region.",
            Why = new Dictionary<string, string> { ["p"] = why, ["p_adjusted"] = why, ["effective_rows"] = why },
        };
    }

    private static string[] GroupTestNames =>
    [
        "classical", "hc0", "hc1", "hc2", "hc3", "score", "cluster", "cr1", "cr2", "time", "time_unrestricted", "newey_west", "permutation", "wild_bootstrap", "last_in", "largest_model_denominator",
    ];

    private static GroupTests NoTests => new(null, null, null, null, null, null, null, null, null, null, null, null, null, null, null, null);

    private static Dictionary<string, string> NotComputed(IEnumerable<string> names, string why) => names.ToDictionary(name => name, _ => why);

    private static Exclusion Tested(
        string group, string[] terms, int rows, int df1, double df2, double rssWithout, double rssWith, Ftest classical, Ftest hc3, Ftest score) => new(
        group, terms, rows, df1, df2, rssWithout, rssWith,
        NoTests with
        {
            Classical = classical.On(df1, df2),
            Hc3 = hc3.On(df1, df2),
            Score = score.On(df1, rows - df1),
        },
        new Dictionary<string, string>
        {
            ["hc0"] = "Not asked for.",
            ["hc1"] = "Not asked for.",
            ["hc2"] = "Not asked for.",
            ["cluster"] = NoCluster,
            ["cr1"] = NoCluster,
            ["cr2"] = NoCluster,
            ["time"] = NoTime,
            ["newey_west"] = NoTime,
            ["permutation"] = "Not asked for.",
            ["wild_bootstrap"] = NoCluster,
            ["last_in"] = "Not asked for.",
            ["largest_model_denominator"] = "Not asked for.",
        },
        "hc3", Hc3Reason, null, null, null, null, new(null, "No elimination rule is declared for this group."), new(null, null, null, null, null, null), null,
        new(0.01, null, null, null), new(null, null, null, null), null, Verdicts.Inconclusive, Materialities.NotShown, "", [], []);

    private sealed record Ftest(double F, double P)
    {
        public TestFigures On(double df1, double df2) => new(F, df1, df2, P);
    }
}
