package org.shearbook.met.taylorgoldstein;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;

/**
 * An independent method: all eigenvalues of the equation by second-order differences on the real axis between rigid
 * walls, by a dense eigen-solver. Reliable for strongly growing waves only, so only those are compared.
 */
class DenseEigenvalueTests {

    private static final long SEED = 20261201L;

    @Test
    void stronglyGrowingWavesAgreeWithADenseEigenSolver() {
        Random random = new Random(SEED);
        for (int number = 0; number < 4; number++) {
            double j = 0.12 * random.nextDouble();
            double k = 0.35 + 0.2 * random.nextDouble();
            double shift = random.nextGaussian();
            double[] dense = {denseGrowth(40, j, k, shift), denseGrowth(80, j, k, shift)};
            // second order in the spacing
            double extrapolated = dense[1] + (dense[1] - dense[0]) / 3;
            double[] z = AnalyticShearFlows.grid(-5, 5, 400);
            double[][] u = AnalyticShearFlows.tanhDerivatives(z, 1, 1);
            double[][] buoyancy = AnalyticShearFlows.tanhDerivatives(z, j, 1);
            for (int i = 0; i < z.length; i++) {
                u[0][i] += shift;
            }
            SampledFlow flow = AnalyticShearFlows.flow(z, u,
                    java.util.Arrays.copyOfRange(buoyancy, 1, SampledFlow.ORDERS), Boundary.RIGID, Boundary.RIGID);
            UnstableRoots roots = new UnstableRoots(
                    new DispersionFunction(flow, 1, 0, AnalyticShearFlows.TANH_CORNER), 1_000_000);
            roots.find(k, shift - 1, shift + 1, 0.05, 1);
            assertThat(roots.roots()).as("seed %d, flow %d", SEED, number).isEqualTo(1);
            assertThat(roots.im(0)).as("seed %d, flow %d, J %f, k %f", SEED, number, j, k)
                    .isCloseTo(extrapolated, within(4e-3));
            assertThat(roots.re(0)).isCloseTo(shift, within(1e-6));
        }
    }

    /**
     * Greatest Im c. With q = w'' - k²w = Lw and b = N²w/(U - c) the equation is linear in c:
     * c q = U q - U'' L⁻¹ q + b, c b = U b - N² L⁻¹ q, up to the sign of b.
     */
    private static double denseGrowth(int intervals, double j, double k, double shift) {
        int m = intervals - 1;
        double h = 10.0 / intervals;
        RealMatrix operator = new Array2DRowRealMatrix(m, m);
        for (int i = 0; i < m; i++) {
            operator.setEntry(i, i, -2 / (h * h) - k * k);
            if (i > 0) {
                operator.setEntry(i, i - 1, 1 / (h * h));
                operator.setEntry(i - 1, i, 1 / (h * h));
            }
        }
        RealMatrix inverse = new LUDecomposition(operator).getSolver().getInverse();
        RealMatrix matrix = new Array2DRowRealMatrix(2 * m, 2 * m);
        for (int i = 0; i < m; i++) {
            double z = -5 + (i + 1) * h;
            double t = Math.tanh(z);
            double curvature = -2 * t * (1 - t * t);
            double n2 = j * (1 - t * t);
            for (int q = 0; q < m; q++) {
                matrix.setEntry(i, q, -curvature * inverse.getEntry(i, q));
                matrix.setEntry(m + i, q, -n2 * inverse.getEntry(i, q));
            }
            matrix.addToEntry(i, i, t + shift);
            matrix.setEntry(i, m + i, 1);
            matrix.setEntry(m + i, m + i, t + shift);
        }
        double greatest = 0;
        for (double im : new EigenDecomposition(matrix).getImagEigenvalues()) {
            greatest = Math.max(greatest, im);
        }
        return greatest;
    }
}
