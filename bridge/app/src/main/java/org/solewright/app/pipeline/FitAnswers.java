package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Arrays;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.fitting.AlgebraicFit;
import org.solewright.analysis.fitting.FittedPath;
import org.solewright.analysis.fitting.FittedSphere;
import org.solewright.analysis.fitting.PathFit;
import org.solewright.analysis.fitting.SphereFit;

/** The questions {@code fit.*}. */
final class FitAnswers {

    /** Work of the pivots' dynamic programme, runs times samples squared, that still ends within seconds. */
    private static final double MOST_RUN_WORK = 2e9;
    /** Samples of a polyline, whose work grows with their cube. */
    private static final int MOST_POLYLINE_SAMPLES = 1500;

    private FitAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "fit.circle", Answerer.of(in -> sphere(in, 2), "points", "weights"),
                "fit.sphere", Answerer.of(in -> sphere(in, 3), "points", "weights"),
                "fit.pivots", Answerer.of(FitAnswers::pivots, "points", "weights", "runs", "segments"));
    }

    private static ObjectNode sphere(QuestionInputs in, int dimensions) throws CallerError, LimitException {
        double[] points = in.rows("points", dimensions);
        int count = points.length / dimensions;
        double[] weights = weights(in, count);
        int loaded = (int) Arrays.stream(weights).filter(w -> w > 0).count();
        if (loaded < dimensions + 1) {
            throw new LimitException(
                    Limit.TOO_FEW_POINTS, loaded + " points that carry weight, expected at least " + (dimensions + 1));
        }
        ObjectNode out = object();
        putSphere(out, "unitNorm", AlgebraicFit.unitNorm(points, dimensions));
        putSphere(out, "kasa", AlgebraicFit.kasa(points, dimensions));
        putSphere(out, "pratt", AlgebraicFit.pratt(points, dimensions));
        putSphere(out, "taubin", AlgebraicFit.taubin(points, dimensions));
        Optional<SphereFit> geometric = SphereFit.fit(points, weights, dimensions);
        putSphere(out, "geometric", geometric.map(SphereFit::sphere));
        geometric.ifPresent(fit -> putScatter((ObjectNode) out.get("geometric"), fit));
        return out;
    }

    private static double[] weights(QuestionInputs in, int count) throws CallerError {
        if (!in.has("weights")) {
            double[] ones = new double[count];
            Arrays.fill(ones, 1);
            return ones;
        }
        double[] weights = in.numbers("weights");
        if (weights.length != count) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input 'weights' has " + weights.length + " numbers, expected one for each of " + count
                            + " points");
        }
        for (double w : weights) {
            if (w < 0) {
                throw new CallerError(
                        CallerError.Code.WRONG_TYPE, "input 'weights' holds " + w + ", expected 0 or more");
            }
        }
        return weights;
    }

    private static void putSphere(ObjectNode out, String name, Optional<FittedSphere> sphere) {
        if (sphere.isEmpty()) {
            out.put(name, Limit.NO_SOLUTION.name());
            return;
        }
        ObjectNode of = out.putObject(name);
        ArrayNode centre = of.putArray("centre");
        for (int axis = 0; axis < sphere.get().dimensions(); axis++) {
            centre.add(sphere.get().centre(axis));
        }
        put(of, "radius", sphere.get().radius());
    }

    private static void putScatter(ObjectNode of, SphereFit fit) {
        put(of, "ssr", fit.sumOfSquares());
        if (fit.degreesOfFreedom() == 0) {
            of.put("sigma", Limit.TOO_FEW_POINTS.name());
            of.put("covariance", Limit.TOO_FEW_POINTS.name());
            return;
        }
        put(of, "sigma", fit.sigma());
        ArrayNode covariance = of.putArray("covariance");
        int size = fit.sphere().dimensions() + 1;
        for (int row = 0; row < size; row++) {
            ArrayNode line = covariance.addArray();
            for (int column = 0; column < size; column++) {
                line.add(fit.covariance(row, column));
            }
        }
    }

    private static ObjectNode pivots(QuestionInputs in) throws CallerError, LimitException {
        double[] points = in.rows("points", 2);
        int count = points.length / 2;
        double[] weights = weights(in, count);
        double[] x = new double[count];
        double[] y = new double[count];
        for (int i = 0; i < count; i++) {
            x[i] = points[2 * i];
            y[i] = points[2 * i + 1];
        }
        if (!in.has("runs") && !in.has("segments")) {
            in.count("runs");
        }
        ObjectNode out = object();
        if (in.has("runs")) {
            putPivots(out, x, y, weights, in.count("runs"));
        }
        if (in.has("segments")) {
            putPolyline(out, x, y, weights, in.count("segments"));
        }
        return out;
    }

    private static void putPivots(ObjectNode out, double[] x, double[] y, double[] weights, int runs)
            throws CallerError, LimitException {
        long loaded = Arrays.stream(weights).filter(w -> w > 0).count();
        if (loaded < runs) {
            throw new LimitException(
                    Limit.TOO_FEW_POINTS,
                    loaded + " points that carry weight, expected at least the " + runs + " runs");
        }
        if ((double) runs * x.length * x.length > MOST_RUN_WORK) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    x.length + " points in " + runs + " runs, expected runs times points squared up to "
                            + MOST_RUN_WORK);
        }
        FittedPath path = PathFit.pivots(x, y, weights, runs);
        ArrayNode pivots = out.putArray("pivots");
        for (int i = 0; i < path.places(); i++) {
            pivots.addArray().add(path.x(i)).add(path.y(i));
        }
        ArrayNode cuts = out.putArray("cuts");
        for (int i = 0; i < path.cuts(); i++) {
            cuts.add(path.cut(i));
        }
        put(out, "sse", path.sumOfSquares());
    }

    private static void putPolyline(ObjectNode out, double[] x, double[] y, double[] weights, int segments)
            throws CallerError, LimitException {
        if (x.length < segments + 1L) {
            throw new LimitException(
                    Limit.TOO_FEW_POINTS, x.length + " points, expected more than the " + segments + " segments");
        }
        if (x.length > MOST_POLYLINE_SAMPLES) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    x.length + " points for a polyline, expected up to " + MOST_POLYLINE_SAMPLES);
        }
        FittedPath path = PathFit.polyline(x, y, weights, segments);
        ArrayNode nodes = out.putArray("polylineNodes");
        for (int i = 0; i < path.cuts(); i++) {
            nodes.add(path.cut(i));
        }
        put(out, "polylineSse", path.sumOfSquares());
    }
}
