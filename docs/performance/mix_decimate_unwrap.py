"""The plain way to follow a tone with NumPy and SciPy, for comparison of cost.

Reads a 24-bit mono WAV file, mixes the tone to zero frequency, decimates, unwraps the phase and
prints the mean frequency. Usage: mix_decimate_unwrap.py FILE TONE_HZ
"""

import sys
import wave

import numpy as np
from scipy import signal

with wave.open(sys.argv[1]) as recording:
    rate = recording.getframerate()
    raw = np.frombuffer(recording.readframes(recording.getnframes()), np.uint8)

wide = np.zeros((len(raw) // 3, 4), np.uint8)
wide[:, 1:] = raw.reshape(-1, 3)
samples = wide.view("<i4")[:, 0] / 2.0**31

tone = float(sys.argv[2])
baseband = samples * np.exp(-2j * np.pi * tone / rate * np.arange(len(samples)))
for factor in (6, 4):
    baseband = signal.decimate(baseband, factor, ftype="fir")
phase = np.unwrap(np.angle(baseband))
hertz = tone + np.diff(phase) * rate / 24 / (2 * np.pi)
print(f"{hertz[100:-100].mean():.6f} Hz")
