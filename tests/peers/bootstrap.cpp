// Peer of `bootstrap.yaml`: the residual bootstrap of the over-dispersed Poisson model (England & Verrall 1999, 2002) on the
// triangle of Taylor & Ashe (1983), one trial after the other, with the standard library's generators and distributions.
// Outcomes: each origin, each future calendar year, the total. Usage: bootstrap TRIALS
#include <algorithm>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <random>
#include <vector>

namespace {
constexpr int N = 10;
const double C[N][N] = {
    {357848, 1124788, 1735330, 2218270, 2745596, 3319994, 3466336, 3606286, 3833515, 3901463},
    {352118, 1236139, 2170033, 3353322, 3799067, 4120063, 4647867, 4914039, 5339085},
    {290507, 1292306, 2218525, 3235179, 3985995, 4132918, 4628910, 4909315},
    {310608, 1418858, 2195047, 3757447, 4029929, 4381982, 4588268},
    {443160, 1136350, 2128333, 2897821, 3402672, 3873311},
    {396132, 1333217, 2180715, 2985752, 3691712},
    {440832, 1288463, 2419861, 3483130},
    {359480, 1421128, 2864498},
    {376686, 1363294},
    {344014}};

void factors(const double p[N][N], double f[N - 1]) {
  for (int j = 0; j < N - 1; j++) {
    double top = 0, bottom = 0;
    for (int i = 0; i < N - 1 - j; i++) {
      top += p[i][j + 1];
      bottom += p[i][j];
    }
    f[j] = top / bottom;
  }
}
}  // namespace

int main(int argc, char** argv) {
  const long trials = argc > 1 ? std::atol(argv[1]) : 1000000;
  double f[N - 1], mean[N][N], spread[N][N], squares = 0;
  std::vector<double> residuals;
  factors(C, f);
  for (int i = 0; i < N; i++) {
    double cumulative[N];
    const int last = N - 1 - i;
    cumulative[last] = C[i][last];
    for (int j = last - 1; j >= 0; j--) cumulative[j] = cumulative[j + 1] / f[j];
    for (int j = 0; j <= last; j++) {
      mean[i][j] = j ? cumulative[j] - cumulative[j - 1] : cumulative[0];
      spread[i][j] = std::sqrt(mean[i][j]);
      const double observed = j ? C[i][j] - C[i][j - 1] : C[i][0];
      const double residual = (observed - mean[i][j]) / spread[i][j];
      squares += residual * residual;
      residuals.push_back(residual * std::sqrt(55.0 / 36.0));
    }
  }
  const double scale = squares / 36.0;

  std::mt19937_64 generator(1);
  std::uniform_int_distribution<int> pick(0, 54);
  std::vector<std::vector<double>> outcomes(2 * N, std::vector<double>(trials));
  for (long t = 0; t < trials; t++) {
    double pseudo[N][N], g[N - 1], byYear[N - 1] = {}, total = 0;
    for (int i = 0; i < N; i++) {
      double cumulative = 0;
      for (int j = 0; j < N - i; j++) {
        cumulative += mean[i][j] + residuals[pick(generator)] * spread[i][j];
        pseudo[i][j] = cumulative;
      }
    }
    factors(pseudo, g);
    for (int i = 0; i < N; i++) {
      double cumulative = pseudo[i][N - 1 - i], reserve = 0;
      for (int j = N - 1 - i; j < N - 1; j++) {
        const double m = cumulative * (g[j] - 1);
        cumulative *= g[j];
        std::gamma_distribution<double> gamma(std::fabs(m) / scale, scale);
        const double amount = m < 0 ? -gamma(generator) : gamma(generator);
        reserve += amount;
        byYear[i + j - (N - 1)] += amount;
      }
      outcomes[i][t] = reserve;
      total += reserve;
    }
    for (int k = 0; k < N - 1; k++) outcomes[N + k][t] = byYear[k];
    outcomes[2 * N - 1][t] = total;
  }

  for (auto& values : outcomes) {
    double sum = 0, sum2 = 0;
    for (double x : values) {
      sum += x;
      sum2 += x * x;
    }
    const double m = sum / trials;
    const auto at = values.begin() + static_cast<long>(0.995 * trials);
    std::nth_element(values.begin(), at, values.end());
    std::printf("%.0f %.0f %.0f\n", m, std::sqrt(sum2 / trials - m * m), *at);
  }
}
