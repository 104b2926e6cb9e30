"""Peer of fund.yaml in NumPy: vectorised over batches of 10,000 trials. Usage: fund.py TRIALS"""
import sys

import numpy as np

BATCH = 10_000


def main():
    trials = int(sys.argv[1]) if len(sys.argv) > 1 else 100_000
    mean = 1 + 0.01 * np.arange(2, 12)
    variance = np.log1p((0.02 * np.arange(2, 12) / mean) ** 2)
    log_sd, log_mean = np.sqrt(variance), np.log(mean) - variance / 2
    random = np.random.default_rng(1)
    wealth, years = np.empty(trials), np.empty(trials)
    for start in range(0, trials, BATCH):
        size = min(BATCH, trials - start)
        fund, price, solvent = np.full(size, 1e6), np.ones(size), np.zeros(size)
        for _ in range(30):
            z = np.sqrt(0.3) * random.standard_normal((1, size)) + np.sqrt(0.7) * random.standard_normal((10, size))
            growth = np.exp(log_mean[:, None] + log_sd[:, None] * z).mean(axis=0)
            price *= 1.025 + 0.012 * random.standard_normal(size)
            fund = np.maximum(0.0, fund * growth - 40_000 * price)
            solvent += fund > 0
        wealth[start : start + size], years[start : start + size] = fund, solvent
    at = int(0.995 * trials)
    print(f"wealth {wealth.mean():.0f} {wealth.std():.0f} {np.partition(wealth, at)[at]:.0f}\nsolvent years {years.mean():.4f}")


main()
