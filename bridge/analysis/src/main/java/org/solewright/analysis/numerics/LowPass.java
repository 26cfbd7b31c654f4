package org.solewright.analysis.numerics;

/**
 * Second-order Butterworth low-pass run forward and backward, so without delay.
 *
 * <p>The cut-off is corrected for the two passes in the bilinear (tan) domain: a sine at the stated cut-off comes out at
 * 1/sqrt 2. ([Winter 2009] divides the analog frequency by 0.802, which is the same only far below the sample rate.)
 * The ends are extended by odd reflection.
 */
public final class LowPass {

    // Two passes of a second-order filter have gain 1/(1 + (w/wc)^4); 1/sqrt 2 at (w/wc)^4 = sqrt 2 - 1.
    private static final double TWO_PASS = Math.pow(Math.sqrt(2) - 1, 0.25);

    private final double b0;
    private final double a1;
    private final double a2;
    private final int pad;

    private LowPass(double b0, double a1, double a2, int pad) {
        this.b0 = b0;
        this.a1 = a1;
        this.a2 = a2;
        this.pad = pad;
    }

    /**
     * A filter for samples of that rate.
     *
     * @param cutoff frequency at which a sine comes out at 0.7071, Hz, more than 0 and less than half the rate
     * @param rate samples per second, Hz
     * @return the filter
     * @throws IllegalArgumentException where the cut-off is out of range
     */
    public static LowPass of(double cutoff, double rate) {
        if (!(cutoff > 0) || !(cutoff < rate / 2)) {
            throw new IllegalArgumentException(
                    "cut-off " + cutoff + " Hz, expected more than 0 Hz and less than half the rate " + rate + " Hz");
        }
        double k = Math.tan(Math.PI * cutoff / rate) / TWO_PASS;
        double norm = 1 / (1 + Math.sqrt(2) * k + k * k);
        double a1 = 2 * (k * k - 1) * norm;
        double a2 = (1 - Math.sqrt(2) * k + k * k) * norm;
        // The impulse response has fallen below 1e-6 after about 14/(2 pi fc) seconds.
        int pad = (int) Math.ceil(14 * rate / (2 * Math.PI * cutoff));
        return new LowPass(k * k * norm, a1, a2, pad);
    }

    /**
     * Filters samples without lost ones.
     *
     * @param in samples; not modified
     * @return filtered samples, as many
     */
    public double[] apply(double[] in) {
        int n = in.length;
        if (n < 2) {
            return in.clone();
        }
        int p = Math.min(pad, n - 1);
        double[] w = new double[n + 2 * p];
        for (int i = 0; i < p; i++) {
            w[i] = 2 * in[0] - in[p - i];
            w[n + p + i] = 2 * in[n - 1] - in[n - 2 - i];
        }
        System.arraycopy(in, 0, w, p, n);
        pass(w);
        reverse(w);
        pass(w);
        reverse(w);
        double[] out = new double[n];
        System.arraycopy(w, p, out, 0, n);
        return out;
    }

    /**
     * Filters each run of samples between lost ones by itself.
     *
     * @param in samples, NaN where lost; not modified
     * @return filtered samples, NaN where lost
     */
    public double[] applyToRuns(double[] in) {
        double[] out = in.clone();
        int i = 0;
        while (i < in.length) {
            if (Double.isNaN(in[i])) {
                i++;
                continue;
            }
            int end = i;
            while (end < in.length && !Double.isNaN(in[end])) {
                end++;
            }
            double[] run = new double[end - i];
            System.arraycopy(in, i, run, 0, run.length);
            System.arraycopy(apply(run), 0, out, i, run.length);
            i = end;
        }
        return out;
    }

    private void pass(double[] w) {
        double x0 = w[0];
        double z1 = x0 * (1 - b0);
        double z2 = x0 * (b0 - a2);
        for (int i = 0; i < w.length; i++) {
            double x = w[i];
            double y = b0 * x + z1;
            z1 = 2 * b0 * x - a1 * y + z2;
            z2 = b0 * x - a2 * y;
            w[i] = y;
        }
    }

    private static void reverse(double[] w) {
        for (int i = 0, j = w.length - 1; i < j; i++, j--) {
            double t = w[i];
            w[i] = w[j];
            w[j] = t;
        }
    }
}
