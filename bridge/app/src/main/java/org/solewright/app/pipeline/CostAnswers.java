package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import org.solewright.analysis.cost.CostIndex;
import org.solewright.analysis.cost.RollingFoot;
import org.solewright.analysis.cost.StepFactor;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.WorkForm;

/** The questions {@code cost.*}: an index, not a metabolic rate. */
final class CostAnswers {

    /** Speeds of the design's table, m/s. */
    private static final double[] SPEEDS = {0.8, 1.0, 1.25, 1.4, 1.6, 1.8};

    private static final int MOST_SPEEDS = 10_000;

    private CostAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "cost.calibration",
                Answerer.of(
                        CostAnswers::calibration,
                        "activationShare",
                        "workCost",
                        "reference",
                        "naturalFrequency",
                        "gravity"),
                "cost.optimum",
                Answerer.of(
                        CostAnswers::optimum,
                        "speed",
                        "limbLength",
                        "foot",
                        "workForm",
                        "seriesShare",
                        "workCost",
                        "swingCost",
                        "pendulumSwingCost",
                        "naturalFrequency",
                        "activationCost",
                        "gravity"),
                "cost.optimum-by-speed",
                Answerer.of(
                        CostAnswers::bySpeed,
                        "speeds",
                        "mass",
                        "limbLength",
                        "foot",
                        "workForm",
                        "seriesShare",
                        "workCost",
                        "swingCost",
                        "pendulumSwingCost",
                        "naturalFrequency",
                        "activationCost",
                        "gravity"),
                "cost.rates",
                Answerer.of(
                        CostAnswers::rates,
                        "stepLength",
                        "speed",
                        "mass",
                        "limbLength",
                        "foot",
                        "workForm",
                        "seriesShare",
                        "workCost",
                        "swingCost",
                        "pendulumSwingCost",
                        "naturalFrequency",
                        "activationCost",
                        "gravity"));
    }

    private static ObjectNode calibration(QuestionInputs in) throws CallerError, LimitException {
        QuestionInputs reference = in.object("reference");
        double share = in.share("activationShare", 0);
        if (!(share < 1)) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE, "input 'activationShare' is " + share + ", expected 0 to below 1");
        }
        boolean isPendulum = in.has("naturalFrequency");
        CostIndex index = CostIndex.calibrated(
                in.positive("workCost", CostIndex.DEFAULT_WORK_COST),
                share,
                reference.number("rollingRatio"),
                reference.number("limbLength"),
                reference.number("stepLength"),
                reference.positive("speed"),
                isPendulum ? in.positive("naturalFrequency") : 0,
                in.gravity());
        ObjectNode out = object();
        put(out, isPendulum ? "pendulumSwingCost" : "swingCost", index.swingCost());
        put(out, "activationCost", index.activationCost());
        return out;
    }

    private static CostIndex index(QuestionInputs in) throws CallerError {
        boolean isPendulum = in.has("pendulumSwingCost") || (in.has("naturalFrequency") && !in.has("swingCost"));
        if (isPendulum) {
            in.setAside("swingCost");
        } else {
            in.setAside("naturalFrequency");
        }
        return new CostIndex(
                in.notNegative("workCost", CostIndex.DEFAULT_WORK_COST),
                isPendulum
                        ? in.notNegative("pendulumSwingCost")
                        : in.notNegative("swingCost", CostIndex.DEFAULT_SWING_COST),
                in.notNegative("activationCost", CostIndex.DEFAULT_ACTIVATION_COST),
                isPendulum ? in.positive("naturalFrequency") : 0,
                in.gravity());
    }

    private static StepFactor foot(QuestionInputs in) throws CallerError, LimitException {
        double limb = in.number("limbLength");
        WorkForm form = in.workForm().orElse(WorkForm.PUSH_OFF);
        double share = in.share("seriesShare", 1);
        QuestionInputs foot = in.object("foot");
        String kind = foot.word("kind").orElse("given");
        if (kind.equals("rolling")) {
            double ratio = foot.number("rollingRatio");
            RollingFoot.requireArc(limb, ratio * limb);
            return new StepFactor.Rolling(form, limb, ratio);
        }
        double segments = VaultingStep.segmentCount(foot.number("segments"));
        VaultingStep.requireLimb(limb);
        return switch (kind) {
            case "optimum" -> new StepFactor.Optimum(form, segments, limb, share);
            case "equal" -> new StepFactor.Equal(form, segments, limb, share);
            case "given" -> new StepFactor.Given(form, segments, limb, foot.number("footLength", 0), share);
            default ->
                throw new CallerError(
                        CallerError.Code.WRONG_TYPE,
                        "'kind' of input 'foot' is \"" + QuestionInputs.shown(kind)
                                + "\", expected one of rolling, given, equal, optimum");
        };
    }

    private static ObjectNode optimum(QuestionInputs in) throws CallerError, LimitException {
        StepFactor foot = foot(in);
        CostIndex.Optimum optimum = index(in).optimum(foot, in.positive("speed"));
        ObjectNode out = object();
        put(out, "optimumStepLength", optimum.stepLength());
        put(out, "ratePerMass", optimum.rates().total());
        out.put("atBound", optimum.isAtBound());
        return out;
    }

    private static ArrayNode bySpeed(QuestionInputs in) throws CallerError, LimitException {
        StepFactor foot = foot(in);
        CostIndex index = index(in);
        double mass = in.positive("mass");
        double[] speeds = in.has("speeds") ? in.numbers("speeds") : SPEEDS;
        if (speeds.length > MOST_SPEEDS) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "input 'speeds' has " + speeds.length + " numbers, expected at most " + MOST_SPEEDS);
        }
        ArrayNode out = object().arrayNode();
        for (double speed : speeds) {
            if (!(speed > 0)) {
                throw new CallerError(
                        CallerError.Code.WRONG_TYPE, "input 'speeds' holds " + speed + ", expected more than 0");
            }
            CostIndex.Optimum optimum = index.optimum(foot, speed);
            CostIndex.Rates r = optimum.rates();
            ObjectNode of = out.addObject();
            put(of, "speed", speed);
            put(of, "optimumStepLength", optimum.stepLength());
            of.put("atBound", optimum.isAtBound());
            put(of, "rate", mass * r.total());
            put(of, "workRate", mass * r.work());
            put(of, "swingRate", mass * r.swing());
            put(of, "activationRate", mass * r.activation());
            put(of, "costOfTransport", r.total() / (index.gravity() * speed));
        }
        return out;
    }

    private static ObjectNode rates(QuestionInputs in) throws CallerError, LimitException {
        StepFactor foot = foot(in);
        CostIndex index = index(in);
        double stepLength = in.number("stepLength");
        foot.at(stepLength);
        CostIndex.Rates r = index.at(foot, in.positive("speed"), stepLength);
        double mass = in.positive("mass");
        ObjectNode out = object();
        put(out, "workRate", mass * r.work());
        put(out, "swingRate", mass * r.swing());
        put(out, "activationRate", mass * r.activation());
        return out;
    }
}
