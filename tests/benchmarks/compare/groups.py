"""F, p and the Wald F with HC3 of every left-out group, by statsmodels: python3 groups.py DATA.csv FINAL GROUPS (see groups.R)."""
import sys
import time

import numpy as np
import pandas as pd
import statsmodels.api as sm

path, n_final, groups = sys.argv[1], int(sys.argv[2]), int(sys.argv[3])
started = time.process_time()
data = pd.read_csv(path)
print(f"read {time.process_time() - started:.3f} s processor")
final = [f"f{i + 1}" for i in range(n_final)]
left = [name for name in data.columns if name not in ["y", *final]]
started = time.process_time()
for g in range(groups):
    z = left[g::groups]
    rows = data[["y", *final, *z]].dropna()
    small = sm.OLS(rows["y"], sm.add_constant(rows[final])).fit()
    large = sm.OLS(rows["y"], sm.add_constant(rows[final + z])).fit()
    f, p, _ = large.compare_f_test(small)
    wald = large.get_robustcov_results("HC3", use_t=True).f_test(np.eye(len(large.params))[-len(z):])
    print(f"g{g + 1} rows {len(rows)} F {f:.15g} p {p:.15g} HC3 F {np.squeeze(wald.fvalue):.15g} p {np.squeeze(wald.pvalue):.15g}")
print(f"fits and tests {time.process_time() - started:.3f} s processor")
