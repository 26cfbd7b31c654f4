package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import org.solewright.analysis.dynamics.CircularTrack;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.SprawledLimb;

/** The questions {@code sprawl.*}. */
final class SprawlAnswers {

    private SprawlAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "sprawl.trochoid",
                Answerer.of(
                        SprawlAnswers::trochoid,
                        "femurLength",
                        "hipHeight",
                        "sphereRadius",
                        "forwardSpeed",
                        "protraction",
                        "stanceTime"),
                "sprawl.circle",
                Answerer.of(SprawlAnswers::circle, "trackRadius", "sphereRadius", "turnAngle"));
    }

    private static ObjectNode trochoid(QuestionInputs in) throws CallerError, LimitException {
        double time = in.positive("stanceTime");
        double protraction = in.angle("protraction");
        if (!(protraction > 0)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input 'protraction' is " + protraction + ", expected an angle between 0 and pi rad");
        }
        SprawledLimb limb = SprawledLimb.of(
                in.number("femurLength"),
                in.number("hipHeight"),
                in.number("sphereRadius"),
                in.positive("forwardSpeed"),
                protraction,
                time);
        ObjectNode out = object();
        put(out, "planarRadius", limb.planarRadius());
        put(out, "rateRatio", limb.rateRatio());
        put(out, "trackLength", limb.trackLength());
        put(out, "netAdvance", limb.netAdvance());
        ArrayNode x = out.putArray("kneeX");
        ArrayNode y = out.putArray("kneeY");
        ArrayNode curvature = out.putArray("trackCurvature");
        for (int quarter = 0; quarter <= 2; quarter++) {
            double t = time * quarter / 4;
            x.add(limb.kneeX(t));
            y.add(limb.kneeY(t));
            double k = limb.curvature(t);
            if (Double.isFinite(k)) {
                curvature.add(k);
            } else {
                curvature.add(Limit.NO_SOLUTION.name());
            }
        }
        triple(out, "contactQuarter", limb.contact(time / 4));
        triple(out, "contactMid", limb.contact(time / 2));
        triple(out, "contactEnd", limb.contact(time));
        matrix(out, limb.rotation(time));
        return out;
    }

    private static ObjectNode circle(QuestionInputs in) throws CallerError, LimitException {
        CircularTrack track =
                CircularTrack.of(in.number("trackRadius"), in.number("sphereRadius"), in.number("turnAngle"));
        ObjectNode out = object();
        put(out, "circleAngle", track.circleAngle());
        triple(out, "contactEnd", track.contactEnd());
        matrix(out, track.rotationEnd());
        put(out, "sphereArcAngle", track.sphereArcAngle());
        return out;
    }

    private static void triple(ObjectNode out, String name, double[] v) {
        ArrayNode list = out.putArray(name);
        for (double x : v) {
            list.add(x);
        }
    }

    private static void matrix(ObjectNode out, double[] m) {
        ArrayNode rows = out.putArray("rotationEnd");
        for (int row = 0; row < 3; row++) {
            rows.addArray().add(m[3 * row]).add(m[3 * row + 1]).add(m[3 * row + 2]);
        }
    }
}
