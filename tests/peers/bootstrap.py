"""Peer of bootstrap.yaml in NumPy: vectorised over batches of 10,000 trials. Usage: bootstrap.py TRIALS"""
import sys

import numpy as np

ROWS = [
    [357848, 1124788, 1735330, 2218270, 2745596, 3319994, 3466336, 3606286, 3833515, 3901463],
    [352118, 1236139, 2170033, 3353322, 3799067, 4120063, 4647867, 4914039, 5339085],
    [290507, 1292306, 2218525, 3235179, 3985995, 4132918, 4628910, 4909315],
    [310608, 1418858, 2195047, 3757447, 4029929, 4381982, 4588268],
    [443160, 1136350, 2128333, 2897821, 3402672, 3873311],
    [396132, 1333217, 2180715, 2985752, 3691712],
    [440832, 1288463, 2419861, 3483130],
    [359480, 1421128, 2864498],
    [376686, 1363294],
    [344014],
]
N = 10
BATCH = 10_000


def fit():
    factors = [sum(r[j + 1] for r in ROWS[: N - 1 - j]) / sum(r[j] for r in ROWS[: N - 1 - j]) for j in range(N - 1)]
    cells, means, observed = [], [], []
    for i, row in enumerate(ROWS):
        cumulative = [0.0] * len(row)
        cumulative[-1] = float(row[-1])
        for j in range(len(row) - 2, -1, -1):
            cumulative[j] = cumulative[j + 1] / factors[j]
        for j in range(len(row)):
            cells.append((i, j))
            means.append(cumulative[j] - (cumulative[j - 1] if j else 0.0))
            observed.append(row[j] - (row[j - 1] if j else 0.0))
    means, observed = np.array(means), np.array(observed)
    residuals = (observed - means) / np.sqrt(means)
    return cells, means, residuals * np.sqrt(55 / 36), float(np.sum(residuals**2) / 36)


def main():
    trials = int(sys.argv[1]) if len(sys.argv) > 1 else 200_000
    cells, means, pool, scale = fit()
    random = np.random.default_rng(1)
    outcomes = np.empty((2 * N, trials))
    for start in range(0, trials, BATCH):
        size = min(BATCH, trials - start)
        increments = means[:, None] + pool[random.integers(0, 55, (55, size))] * np.sqrt(means)[:, None]
        pseudo = np.zeros((N, N, size))
        for (i, j), row in zip(cells, increments):
            pseudo[i, j] = row + (pseudo[i, j - 1] if j else 0.0)
        factors = [pseudo[: N - 1 - j, j + 1].sum(axis=0) / pseudo[: N - 1 - j, j].sum(axis=0) for j in range(N - 1)]
        out = outcomes[:, start : start + size]
        out[:] = 0.0
        for i in range(N):
            cumulative = pseudo[i, N - 1 - i]
            for j in range(N - 1 - i, N - 1):
                mean = cumulative * (factors[j] - 1)
                cumulative = cumulative * factors[j]
                amount = np.copysign(random.gamma(np.abs(mean) / scale, scale), mean)
                out[i] += amount
                out[N + i + j - (N - 1)] += amount
                out[2 * N - 1] += amount
    for values in outcomes:
        print(f"{values.mean():.0f} {values.std():.0f} {np.partition(values, int(0.995 * trials))[int(0.995 * trials)]:.0f}")


main()
