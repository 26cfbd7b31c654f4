package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;
import static org.solewright.app.pipeline.Answerer.putOrCode;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import org.solewright.analysis.cost.PivotPolygon;
import org.solewright.analysis.cost.RollingFoot;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/** The questions {@code rolling.*}. */
final class RollingAnswers {

    private RollingAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "rolling.arc",
                Answerer.of(RollingAnswers::arc, "stepLength", "limbLength", "arcRadius"),
                "rolling.short-arc",
                Answerer.of(RollingAnswers::shortArc, "stepLength", "limbLength", "arcRadius", "arcHalfAngle"),
                "rolling.polygon",
                Answerer.of(RollingAnswers::polygon, "pivots", "stepLength"),
                "rolling.equivalent-arc",
                Answerer.of(
                        RollingAnswers::equivalentArc,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "footLength",
                        "seriesShare"));
    }

    private static ObjectNode arc(QuestionInputs in) throws CallerError, LimitException {
        RollingFoot foot = RollingFoot.full(in.number("stepLength"), in.number("limbLength"), in.number("arcRadius"));
        ObjectNode out = object();
        whole(out, foot);
        return out;
    }

    private static void whole(ObjectNode out, RollingFoot foot) {
        put(out, "halfAngle", foot.halfAngle());
        put(out, "contactAngle", foot.contactAngle());
        put(out, "transitionAngle", foot.transitionAngle());
        put(out, "arcLengthNeeded", foot.arcLengthNeeded());
        factors(out, foot);
        putOrCode(out, "pushOffFactorSmallAngle", () -> foot.factor(WorkForm.PUSH_OFF_SMALL_ANGLE));
        putOrCode(out, "noPushFactorSmallAngle", () -> foot.factor(WorkForm.NO_PUSH_SMALL_ANGLE));
    }

    private static void factors(ObjectNode out, RollingFoot foot) {
        putOrCode(out, "pushOffFactor", () -> foot.factor(WorkForm.PUSH_OFF));
        putOrCode(out, "noPushFactor", () -> foot.factor(WorkForm.NO_PUSH));
        putOrCode(out, "simultaneousFactor", () -> foot.factor(WorkForm.SIMULTANEOUS));
    }

    private static ObjectNode shortArc(QuestionInputs in) throws CallerError, LimitException {
        RollingFoot foot = RollingFoot.shortArc(
                in.number("stepLength"), in.number("limbLength"), in.number("arcRadius"), in.number("arcHalfAngle"));
        ObjectNode out = object();
        if (!foot.truncated()) {
            whole(out, foot);
            out.put("truncated", false);
            out.putNull("edgeRadius");
            put(out, "arcLength", foot.arcLength());
            return out;
        }
        put(out, "halfAngle", foot.halfAngle());
        put(out, "contactAngle", foot.contactAngle());
        put(out, "transitionAngle", foot.transitionAngle());
        put(out, "edgeRadius", foot.edgeRadius());
        put(out, "rolledHalfAngle", foot.rolledHalfAngle());
        put(out, "arcLength", foot.arcLength());
        out.put("truncated", true);
        factors(out, foot);
        return out;
    }

    private static ObjectNode polygon(QuestionInputs in) throws CallerError, LimitException {
        PivotPolygon polygon = PivotPolygon.of(in.rows("pivots", 2), in.number("stepLength"));
        ObjectNode out = object();
        ArrayNode transitions = out.putArray("transitions");
        for (int i = 0; i < polygon.transitions(); i++) {
            int transition = i;
            ObjectNode of = transitions.addObject();
            of.put("kind", i + 1 < polygon.transitions() ? "inner" : "step");
            put(of, "spacing", polygon.spacing(i));
            put(of, "radiusBefore", polygon.radiusBefore(i));
            put(of, "radiusAfter", polygon.radiusAfter(i));
            put(of, "transitionAngle", polygon.angle(i));
            putOrCode(of, "pushOffFactor", () -> polygon.factor(WorkForm.PUSH_OFF, transition));
            putOrCode(of, "noPushFactor", () -> polygon.factor(WorkForm.NO_PUSH, transition));
            putOrCode(of, "simultaneousFactor", () -> polygon.factor(WorkForm.SIMULTANEOUS, transition));
        }
        putOrCode(out, "pushOffFactor", () -> polygon.factor(WorkForm.PUSH_OFF));
        putOrCode(out, "noPushFactor", () -> polygon.factor(WorkForm.NO_PUSH));
        return out;
    }

    private static ObjectNode equivalentArc(QuestionInputs in) throws CallerError, LimitException {
        VaultingStep step = VaultingStep.given(
                in.number("segments"),
                in.number("stepLength"),
                in.number("limbLength"),
                in.number("footLength", 0),
                in.share("seriesShare", 1));
        double factor = step.factor(WorkForm.PUSH_OFF);
        ObjectNode out = object();
        put(out, "stepFactor", factor);
        putOrCode(out, "rollingRatio", () -> RollingFoot.equivalentRatio(step.stepLength(), step.limbLength(), factor));
        put(out, "rollingRatioSmallAngle", RollingFoot.equivalentRatioSmallAngle(step));
        return out;
    }
}
