"""Reference vectors for tests/reference/signal-scipy.test.ts, made with scipy.signal.

Run: python3 tests/reference/generate/signal-vectors.py > tests/reference/data/signal-vectors.json
(made with numpy 2.4.6 and scipy 1.17.1). The record is written out in the file, so the
test needs neither Python nor the same random generator.
"""

import json

import numpy as np
import scipy
from scipy import signal

rng = np.random.default_rng(20)
fs = 1000.0


def record(n):
    t = np.arange(n) / fs
    x = 0.7 + 2 * np.sin(2 * np.pi * 50.3 * t) + 0.5 * np.cos(2 * np.pi * 121 * t + 1)
    return np.round(x + 0.3 * rng.standard_normal(n), 6)


NAMES = {"rectangular": "boxcar", "hann": "hann", "hamming": "hamming", "blackman": "blackman", "flat-top": "flattop"}
out = {"made_with": f"numpy {np.__version__}, scipy {scipy.__version__}", "sampleRateHz": fs, "periodograms": [], "welch": [], "ffts": []}
for n in (60, 64, 97):
    x = record(n)
    for ours, theirs in NAMES.items():
        _, power = signal.periodogram(x, fs, window=theirs, detrend="constant", scaling="spectrum")
        out["periodograms"].append({"window": ours, "samples": x.tolist(), "power": power.tolist()})
for n, block in ((200, 64), (210, 50), (155, 51)):
    x = record(n)
    for ours, theirs in (("hann", "hann"), ("flat-top", "flattop")):
        _, spectrum = signal.welch(x, fs, window=theirs, nperseg=block, noverlap=block // 2, scaling="spectrum")
        _, density = signal.welch(x, fs, window=theirs, nperseg=block, noverlap=block // 2, scaling="density")
        out["welch"].append({"window": ours, "blockLength": block, "samples": x.tolist(), "power": spectrum.tolist(), "density": density.tolist()})
for n in (1, 2, 3, 5, 12, 16, 31, 45):
    z = np.round(rng.standard_normal(n) + 1j * rng.standard_normal(n), 6)
    f = np.fft.fft(z)
    out["ffts"].append({"re": z.real.tolist(), "im": z.imag.tolist(), "outRe": f.real.tolist(), "outIm": f.imag.tolist()})
x = record(240) + np.where(np.arange(240) % 40 < 6, np.cos(2 * np.pi * 300 * np.arange(240) / fs), 0)
x = np.round(x, 6)
spectrum = np.fft.fft(x)
frequency = np.fft.fftfreq(len(x), 1 / fs)
band = np.where((frequency >= 250) & (frequency <= 350), 2, 0)
out["envelope"] = {"lowHz": 250, "highHz": 350, "samples": x.tolist(), "envelope": np.abs(np.fft.ifft(spectrum * band)).tolist()}
print(json.dumps(out, separators=(",", ":")))
