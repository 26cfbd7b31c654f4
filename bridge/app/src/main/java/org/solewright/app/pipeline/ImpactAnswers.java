package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.solewright.analysis.dynamics.LimbChain;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.PlasticImpact;

/** The question {@code impact.chain}. */
final class ImpactAnswers {

    private static final int MOST_SEGMENTS = 200;

    private ImpactAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "impact.chain", Answerer.of(ImpactAnswers::chain, "hipMass", "segments", "hipVelocity", "constraints"));
    }

    private static ObjectNode chain(QuestionInputs in) throws CallerError, LimitException {
        List<QuestionInputs> given = in.objects("segments");
        if (given.size() > MOST_SEGMENTS) {
            throw wrong("input 'segments' has " + given.size() + " entries, expected at most " + MOST_SEGMENTS);
        }
        List<LimbChain.Segment> segments = new ArrayList<>();
        for (QuestionInputs s : given) {
            segments.add(new LimbChain.Segment(
                    s.index("parent", -1, segments.size() - 1),
                    s.notNegative("length"),
                    s.notNegative("mass"),
                    s.number("com"),
                    s.notNegative("inertia"),
                    s.number("angle"),
                    s.number("rate", 0)));
        }
        double[] hip = in.numbers("hipVelocity");
        if (hip.length != 2) {
            throw wrong("input 'hipVelocity' has " + hip.length + " numbers, expected 2");
        }
        LimbChain chain = new LimbChain(in.notNegative("hipMass"), segments);
        PlasticImpact impact =
                PlasticImpact.of(chain, hip[0], hip[1], constraints(in.objects("constraints"), segments.size()));
        return answer(impact, segments.size());
    }

    private static List<PlasticImpact.Constraint> constraints(List<QuestionInputs> given, int segments)
            throws CallerError {
        if (given.size() > 2 * MOST_SEGMENTS) {
            throw wrong("input 'constraints' has " + given.size() + " entries, expected at most " + 2 * MOST_SEGMENTS);
        }
        List<PlasticImpact.Constraint> constraints = new ArrayList<>();
        for (QuestionInputs c : given) {
            if (c.has("lock")) {
                double[] pair = c.numbers("lock");
                if (pair.length != 2 || !isSegment(pair[0], segments) || !isSegment(pair[1], segments)) {
                    throw wrong("a 'lock' names segments " + Arrays.toString(pair) + ", expected two numbers from 0 to "
                            + (segments - 1));
                }
                constraints.add(new PlasticImpact.Lock((int) pair[0], (int) pair[1]));
                continue;
            }
            List<Double> direction = new ArrayList<>();
            if (c.has("direction")) {
                for (double d : c.numbers("direction")) {
                    direction.add(d);
                }
                if (direction.size() != 2) {
                    throw wrong("a 'direction' has " + direction.size() + " numbers, expected 2");
                }
            }
            constraints.add(
                    new PlasticImpact.Point(c.index("segment", -1, segments - 1), c.number("distance"), direction));
        }
        return constraints;
    }

    private static boolean isSegment(double number, int segments) {
        return number == Math.rint(number) && number >= 0 && number < segments;
    }

    private static CallerError wrong(String message) {
        return new CallerError(CallerError.Code.WRONG_TYPE, message);
    }

    private static ObjectNode answer(PlasticImpact impact, int segments) {
        ObjectNode out = object();
        ArrayNode hip = out.putArray("hipVelocity");
        hip.add(impact.hipX()).add(impact.hipZ());
        ArrayNode rates = out.putArray("rates");
        for (int s = 0; s < segments; s++) {
            rates.add(impact.rate(s));
        }
        ArrayNode impulses = out.putArray("impulses");
        for (double p : impact.impulses()) {
            impulses.add(p);
        }
        put(out, "loss", impact.loss());
        put(out, "energyBefore", impact.energyBefore());
        put(out, "energyAfter", impact.energyAfter());
        return out;
    }
}
