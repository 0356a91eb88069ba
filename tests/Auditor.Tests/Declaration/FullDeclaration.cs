namespace Auditor.Tests.Declaration;

/// <summary>A declaration that uses every key and every kind of term once.</summary>
internal static class FullDeclaration
{
    public const string Yaml = """
        audit: 1                                  # format version
        model:
          id: tractor-lease-loss
          title: Loss rate on defaulted tractor leases
          version: "2026.20"
          prepared_by: Model development
        data:
          source: [leases-1.csv, leases-2.csv]
          sha256: 3FA9c0de3FA9c0de3FA9c0de3FA9c0de3FA9c0de3FA9c0de3FA9c0de3FA9c0de
          columns:
            region: {kind: levels, reference: north}
            grade:  {levels: [A, B, C]}
            opened: {kind: date}
            2008: {kind: number}
            remark: {kind: text}
          missing: ["", NA]
          keep:
            - {column: status, equals: closed}
            - {column: source, not: NO}
            - {column: grade, in: [A, C]}
            - {column: opened, from: 2001-01-01, to: 2019-12-31}
            - {column: price, present: true}
          row_label: lease_no
          time: opened
          period: quarter
          unit: dealer
          serial_lag: 4
          split: {column: opened, at: 2008-09-01}
          cluster: dealer_group
          weights: {column: exposure, kind: precision}
          segments: [region, grade]
        response: {log1p: loss_rate}
        final_model:
          intercept: true
          terms:
            - advance_rate
            - {log: price}
            - {log10: {of: price, plus: 0.5}}
            - region
            - {product: [advance_rate, region]}
            - {power: {of: age, exponent: 3}}
            - {polynomial: {of: hours, degree: 2}}
            - {spline: {of: weight, knots: [12, 36, 60]}}
            - {bins: {of: age, cuts: [24, 48]}}
            - {indicator: {of: grade, equals: C}}
            - {step: {of: opened, from: 2020-04-01}}
            - {pulse: {of: opened, from: 2008-09-01, to: 2009-03-31}}
        left_out:
          - group: engine condition
            terms: [engine_hours, {square: engine_hours}]
            because: Not significant at 5 %.
            reported: {f: 0.710, df: [2, 480], p: "< 0.001"}
          - group: calendar
            terms:
              - {season: {of: opened, by: quarter}}
              - {trend: opened}
          - group: money
            terms: [{ratio: [balance, price]}, {minus: [balance, {sqrt: price}]}, 2008, NO]
          - group: tails
            terms: [{winsorise: {of: price, lower: 0.01, upper: 0.99}}, {cap: {of: price, lower: 100}}]
          - group: past
            terms:
              - {moving_average: {of: price, over: 4}}
              - {lag: {of: {change: {of: {log: price}, by: 1}}, by: 1}}
        elimination:
          rule: {drop_above: 0.05}
          by: term
          forced: [advance_rate, {product: [region, advance_rate]}]
          steps:
            - {drop: money, reported: {p: 4.9e-01}}
            - {drop: engine condition}
        reported:
          rows_used: 512
          r_squared: 0.410
          adjusted_r_squared: .407
          residual_sd: 1e-05
          f: 61.2
          coefficients:
            advance_rate: {estimate: 0.3120, standard_error: 0.041, p: "< 0.001"}
            "region = south": {estimate: -0.022}
        """;
}
