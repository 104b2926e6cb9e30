// Peer of `fund.yaml`: a fund of ten assets over thirty years, one trial after the other, with the standard library's generator
// and normal distribution. Usage: fund TRIALS
#include <algorithm>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <random>
#include <vector>

int main(int argc, char** argv) {
  const long trials = argc > 1 ? std::atol(argv[1]) : 100000;
  double logMean[10], logSd[10];
  for (int i = 0; i < 10; i++) {
    const double mean = 1 + 0.01 * (i + 2), cv = 0.02 * (i + 2) / mean;
    const double variance = std::log(1 + cv * cv);
    logSd[i] = std::sqrt(variance);
    logMean[i] = std::log(mean) - variance / 2;
  }
  const double common = std::sqrt(0.3), own = std::sqrt(0.7);
  std::mt19937_64 generator(1);
  std::normal_distribution<double> normal;
  std::vector<double> wealth(trials), years(trials);
  for (long t = 0; t < trials; t++) {
    double fund = 1e6, price = 1;
    int solvent = 0;
    for (int year = 0; year < 30; year++) {
      const double factor = normal(generator);
      double growth = 0;
      for (int i = 0; i < 10; i++) growth += std::exp(logMean[i] + logSd[i] * (common * factor + own * normal(generator)));
      price *= 1.025 + 0.012 * normal(generator);
      fund = std::max(0.0, fund * growth / 10 - 40000 * price);
      solvent += fund > 0;
    }
    wealth[t] = fund;
    years[t] = solvent;
  }
  double sum = 0, sum2 = 0, solvent = 0;
  for (long t = 0; t < trials; t++) {
    sum += wealth[t];
    sum2 += wealth[t] * wealth[t];
    solvent += years[t];
  }
  const auto at = wealth.begin() + static_cast<long>(0.995 * trials);
  std::nth_element(wealth.begin(), at, wealth.end());
  const double mean = sum / trials;
  std::printf("wealth %.0f %.0f %.0f\nsolvent years %.4f\n", mean, std::sqrt(sum2 / trials - mean * mean), *at, solvent / trials);
}
