using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using Xunit;
using Xunit.Abstractions;

namespace ProbeCal.Peers.Tests;

/// <summary>Fits of random data sets against numpy and scipy, which share nothing with ours but the data.</summary>
public class ScipyTests(ITestOutputHelper output)
{
    private const int DefaultSeed = 20041632;

    private static readonly int Count = Environment.GetEnvironmentVariable("PROBECAL_FULL") == "1" ? 5_000 : 300;
    private static readonly int Seed =
        int.TryParse(Environment.GetEnvironmentVariable("PROBECAL_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : DefaultSeed;

    /// <summary>
    /// Weighted polynomials of degree 1 to 4: parameters and covariance by numpy's least squares over singular values. Our values at the points agree to rounding; coefficients lose what the
    /// powers of an uncentred x lose in numpy, so they are compared in units of their standard uncertainty.
    /// </summary>
    [SkippableFact]
    public void WeightedPolynomials_AreThoseOfNumpy()
    {
        ScipyPeer.Require();
        Random random = new(Seed);
        List<double[]> cases = [];
        for (int i = 0; i < Count; i++)
        {
            int degree = 1 + (i % 4);
            int n = degree + 2 + random.Next(12);
            double[] x = [.. Enumerable.Range(0, n).Select(k => (10.0 * k) + (8.0 * random.NextDouble()))];
            double[] y = [.. x.Select(t => 3.0 + (0.5 * t) - (0.002 * t * t) + Normal(random))];
            double[] u = [.. x.Select(_ => 0.2 + random.NextDouble())];
            cases.Add([degree, n, .. x, .. y, .. u]);
        }

        double[][] peer = ScipyPeer.Evaluate(
            "d, n = int(v[0]), int(v[1])\nx, y, u = v[2:2+n], v[2+n:2+2*n], v[2+2*n:]\np, c = np.polyfit(x, y, d, w=1/u, cov='unscaled')\nr = list(p[::-1]) + list(c[::-1, ::-1].ravel()) + list(np.polyval(p, x))", cases);
        double worst = 0.0;
        double worstVariance = 0.0;
        for (int i = 0; i < Count; i++)
        {
            int degree = (int)cases[i][0];
            int n = (int)cases[i][1];
            double[] x = cases[i][2..(2 + n)];
            Assert.Equal(Status.Ok, LeastSquares.Polynomial(x, cases[i][(2 + n)..(2 + (2 * n))], cases[i][(2 + (2 * n))..], degree, out PolynomialFit? fit));
            for (int k = 0; k <= degree; k++)
            {
                worst = Math.Max(worst, Math.Abs(fit!.Result.Parameter(k) - peer[i][k]) / fit.Result.StandardUncertainty(k));
                for (int l = 0; l <= degree; l++)
                {
                    double scale = fit.Result.StandardUncertainty(k) * fit.Result.StandardUncertainty(l);
                    worstVariance = Math.Max(worstVariance, Math.Abs(fit.Result.Covariance(k, l) - peer[i][degree + 1 + (k * (degree + 1)) + l]) / scale);
                }
            }

            int values = degree + 1 + ((degree + 1) * (degree + 1));
            for (int k = 0; k < n; k++)
            {
                worst = Math.Max(worst, Math.Abs(fit!.Value(x[k]) - peer[i][values + k]) / cases[i][2 + (2 * n) + k]);
            }
        }

        output.WriteLine($"{Count} polynomials, seed {Seed}: worst {worst:E1} of u, covariance {worstVariance:E1}");
        Assert.InRange(worst, 0.0, 1e-8);
        Assert.InRange(worstVariance, 0.0, 1e-8);
    }

    /// <summary>Any linear model: random design matrices by numpy.linalg.lstsq.</summary>
    [SkippableFact]
    public void LinearModels_AreThoseOfNumpy()
    {
        ScipyPeer.Require();
        Random random = new(Seed + 1);
        List<double[]> cases = [];
        for (int i = 0; i < Count; i++)
        {
            int m = 1 + (i % 6);
            int n = m + 1 + random.Next(20);
            cases.Add([m, n, .. Enumerable.Range(0, n * m).Select(_ => Normal(random)), .. Enumerable.Range(0, n).Select(_ => 5.0 * Normal(random))]);
        }

        double[][] peer = ScipyPeer.Evaluate(
            "m, n = int(v[0]), int(v[1])\na, y = v[2:2+n*m].reshape(n, m), v[2+n*m:]\nb = np.linalg.lstsq(a, y, rcond=None)[0]\ns = np.sum((y - a @ b)**2)/(n - m)\nr = list(b) + list(np.sqrt(s*np.diag(np.linalg.pinv(a.T @ a))))", cases);
        double worst = 0.0;
        for (int i = 0; i < Count; i++)
        {
            int m = (int)cases[i][0];
            int n = (int)cases[i][1];
            Assert.Equal(Status.Ok, LeastSquares.Linear(cases[i][2..(2 + (n * m))], m, cases[i][(2 + (n * m))..], null, out FitResult? fit));
            for (int k = 0; k < m; k++)
            {
                worst = Math.Max(worst, Math.Abs(fit!.Parameter(k) - peer[i][k]) / peer[i][m + k]);
                worst = Math.Max(worst, Math.Abs((fit.StandardUncertainty(k) / peer[i][m + k]) - 1.0));
            }
        }

        output.WriteLine($"{Count} linear models, seed {Seed + 1}: worst {worst:E1} of u");
        Assert.InRange(worst, 0.0, 1e-8);
    }

    /// <summary>
    /// Lines and quadratics with errors in both by orthogonal distance regression (ODRPACK). It judges by the sum of squares, which a double holds to 1e-16 of itself: its parameters stand still
    /// some 1e-7 of their u around the best; ten times what that leaves is allowed, and as much of the uncertainties at that place.
    /// </summary>
    [SkippableTheory]
    [InlineData(1)]
    [InlineData(2)]
    public void ErrorsInBoth_AreThoseOfOrthogonalDistanceRegression(int degree)
    {
        ScipyPeer.Require();
        Random random = new(Seed + 1 + degree);
        List<double[]> cases = [];
        for (int i = 0; i < Count; i++)
        {
            int n = degree + 2 + random.Next(8);
            double[] truth = [.. Enumerable.Range(0, n).Select(k => 5.0 + (20.0 * k) + (10.0 * random.NextDouble()))];
            double[] ux = [.. truth.Select(_ => 0.2 + random.NextDouble())];
            double[] uy = [.. truth.Select(_ => 0.05 + (0.3 * random.NextDouble()))];
            double[] x = [.. truth.Zip(ux, (t, u) => t + (u * Normal(random)))];
            double[] y = [.. truth.Zip(uy, (t, u) => 0.4 + (0.31 * t) - (degree == 2 ? 2e-4 * t * t : 0.0) + (u * Normal(random)))];
            cases.Add([degree, n, .. x, .. ux, .. y, .. uy]);
        }

        double[][] peer = ScipyPeer.Evaluate(
            "d, n = int(v[0]), int(v[1])\nx, ux, y, uy = (v[2+k*n:2+(k+1)*n] for k in range(4))\nf = lambda b, t: sum(b[k]*t**k for k in range(d+1))\n"
            + "o = odr.ODR(odr.RealData(x, y, sx=ux, sy=uy), odr.Model(f, fjacb=lambda b, t: np.array([t**k for k in range(d+1)]), fjacd=lambda b, t: sum(k*b[k]*t**(k-1) for k in range(1, d+1))), beta0=np.polyfit(x, y, d)[::-1], maxit=500, sstol=1e-14, partol=1e-14)\n"
            + "o.set_job(fit_type=0, deriv=2)\nq = o.run()\nr = list(q.beta) + list(np.sqrt(np.diag(q.cov_beta))) + [q.sum_square]", cases);
        double worst = 0.0;
        double worstUncertainty = 0.0;
        for (int i = 0; i < Count; i++)
        {
            int n = (int)cases[i][1];
            double[][] columns = [.. Enumerable.Range(0, 4).Select(k => cases[i][(2 + (k * n))..(2 + ((k + 1) * n))])];
            Status status = degree == 1
                ? ErrorsInBoth.Line(columns[0], columns[1], columns[2], columns[3], null, out PolynomialFit? fit)
                : ErrorsInBoth.Polynomial(columns[0], columns[1], columns[2], columns[3], null, degree, out fit);
            Assert.Equal(Status.Ok, status);
            for (int k = 0; k <= degree; k++)
            {
                double u = fit!.Result.StandardUncertainty(k);
                worst = Math.Max(worst, Math.Abs(fit.Result.Parameter(k) - peer[i][k]) / u);
                worstUncertainty = Math.Max(worstUncertainty, Math.Abs((u / peer[i][degree + 1 + k]) - 1.0));
            }

            // Ours is never above the peer's: both look for the least.
            Assert.InRange(fit!.Result.ChiSquared, 0.0, (peer[i][^1] * (1.0 + 1e-9)) + 1e-12);
        }

        output.WriteLine($"{Count} fits of degree {degree}, seed {Seed + 1 + degree}: worst {worst:E1} of u, uncertainty {worstUncertainty:E1}");
        Assert.InRange(worst, 0.0, 1e-5);
        Assert.InRange(worstUncertainty, 0.0, 1e-6);
    }

    private static double Normal(Random random)
    {
        return Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
    }
}
