/**
 * The outside reader: numpy and scipy, told nothing of Neap's rules but the definitions of
 * measurement.md §2, §3 and §5. Reads `<k>.hz` (float64) and `<k>.db` (float32) of each sweep.
 */
export const SCIPY_SCRIPT = `
import json, os, sys
import numpy as np
from scipy.signal import find_peaks

task = json.load(sys.stdin)

def read(name, kind):
    return np.fromfile(os.path.join(task["folder"], name), dtype=kind).astype(float)

def listed(values):
    return [None if np.isnan(v) else float(v) for v in values]

# Linear in log f or in f inside each segment, the lowest of the segments, none outside.
def limits(segments, hz):
    lowest = np.full(hz.shape, np.inf)
    for s in segments:
        f = np.log10 if s["interpolation"] == "log" else np.asarray
        ends = f(np.array([s["startHz"], s["stopHz"]]))
        inside = (hz >= s["startHz"]) & (hz <= s["stopHz"])
        part = np.interp(f(hz), ends, [s["startDb"], s["stopDb"]])
        lowest = np.where(inside, np.minimum(lowest, part), lowest)
    return np.where(np.isinf(lowest), np.nan, lowest)

# Factors linear in log f; outside a table there is none.
def factors(table, hz):
    x = np.log10([p["frequencyHz"] for p in table])
    y = [p["factorDb"] for p in table]
    return np.interp(np.log10(hz), x, y, left=np.nan, right=np.nan)

# scipy knows no NaN: the trace in the pieces between them.
def peaks(db):
    found = []
    ends = np.flatnonzero(np.isnan(db)).tolist() + [len(db)]
    start = 0
    for end in ends:
        at, about = find_peaks(db[start:end], prominence=6)
        found += [[int(i) + start, float(p)] for i, p in zip(at, about["prominences"])]
        start = end + 1
    return found

# numpy's own percentile of every window, NaN left out.
def floor(db, window):
    half = window // 2
    padded = np.concatenate([np.full(half, np.nan), db, np.full(half, np.nan)])
    windows = np.lib.stride_tricks.sliding_window_view(padded, window)
    partly = np.isnan(windows).any(axis=1)
    out = np.full(db.shape, np.nan)
    if not partly.all():
        out[~partly] = np.percentile(windows[~partly], 20, axis=1)
    for i in np.flatnonzero(partly):
        part = windows[i][~np.isnan(windows[i])]
        if part.size:
            out[i] = np.percentile(part, 20)
    return out

out = []
for k, case in enumerate(task["cases"]):
    hz, db = read(f"{k}.hz", np.float64), read(f"{k}.db", np.float32)
    limit = limits(case["segments"], hz)
    margin = limit - db
    width = np.gradient(hz)
    width[0], width[-1] = hz[1] - hz[0], hz[-1] - hz[-2]
    level = db + 10 * np.log10(50) + 90
    for t in case["transducers"]:
        sign = -1 if t["kind"] == "preamplifier" else 1
        level = level + sign * factors(t["factors"], hz)
    whole = floor(db, case["window"])
    out.append({
        "limits": listed(limit),
        "margin": None if np.isnan(margin).all() else float(np.nanmin(margin)),
        "path": listed(level),
        "peaks": peaks(db),
        "floor": listed(whole),
        "median": float(np.nanmedian(whole)),
        "power": float(10 * np.log10(np.nansum(10 ** (db / 10) * width))),
    })
print(json.dumps(out))
`;
