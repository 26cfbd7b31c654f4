package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.putOrCode;
import static org.solewright.app.pipeline.Answerer.putOrNull;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.analysis.cost.Crossover;
import org.solewright.analysis.cost.EqualCost;
import org.solewright.analysis.cost.Halving;
import org.solewright.analysis.cost.OptimumFoot;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.domain.cost.FootRule;
import org.solewright.domain.cost.WorkForm;

/** The questions {@code transition.*}. */
final class TransitionAnswers {

    private static final List<WorkForm> EXACT = List.of(WorkForm.NO_PUSH, WorkForm.PUSH_OFF, WorkForm.SIMULTANEOUS);

    private TransitionAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "transition.step",
                Answerer.of(
                        TransitionAnswers::step,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "footLength",
                        "footRule",
                        "seriesShare",
                        "workForm",
                        "speed",
                        "mass",
                        "gravity"),
                "transition.crossover",
                Answerer.of(TransitionAnswers::crossover, "segments", "seriesShare"),
                "transition.equal-cost",
                Answerer.of(
                        TransitionAnswers::equalCost,
                        "segments",
                        "limbLength",
                        "stepFactor",
                        "workForm",
                        "seriesShare"),
                "transition.halving",
                Answerer.of(TransitionAnswers::halving, "stepLength", "limbLength"),
                "transition.series-share",
                Answerer.of(
                        TransitionAnswers::seriesShare,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "seriesShare",
                        "workForm"));
    }

    /** A step with its factor in one form. */
    private record Costed(WorkForm form, VaultingStep step, double factor) {}

    private static FootRule footRule(QuestionInputs in) throws CallerError {
        String word = in.word("footRule").orElse(FootRule.GIVEN.word());
        for (FootRule rule : FootRule.values()) {
            if (rule.word().equals(word)) {
                return rule;
            }
        }
        throw new CallerError(
                CallerError.Code.WRONG_TYPE,
                "input 'footRule' is \"" + QuestionInputs.shown(word) + "\", expected one of given, equal, optimum");
    }

    /** The geometry of a step; the optimum foot is that of a work form. */
    static VaultingStep step(QuestionInputs in, WorkForm form) throws CallerError, LimitException {
        double segments = in.number("segments");
        double stepLength = in.number("stepLength");
        double limbLength = in.number("limbLength");
        double share = in.share("seriesShare", 1);
        FootRule rule = footRule(in);
        double foot = 0;
        if (rule == FootRule.GIVEN) {
            foot = in.number("footLength", 0);
        } else {
            in.setAside("footLength");
        }
        return switch (rule) {
            case GIVEN -> VaultingStep.given(segments, stepLength, limbLength, foot, share);
            case EQUAL -> VaultingStep.equalVaults(segments, stepLength, limbLength, share);
            case OPTIMUM -> OptimumFoot.of(form, segments, stepLength, limbLength, share);
        };
    }

    private static ObjectNode step(QuestionInputs in) throws CallerError, LimitException {
        List<Costed> steps = new ArrayList<>();
        for (WorkForm form : in.workForms()) {
            VaultingStep step = step(in, form);
            steps.add(new Costed(form, step, step.factor(form)));
        }
        double speed = in.number("speed");
        double mass = in.positive("mass");
        double gravity = in.gravity();
        ObjectNode out = object();
        for (Costed costed : steps) {
            VaultingStep step = costed.step();
            double work = costed.factor() * mass * speed * speed / 2;
            ObjectNode of = out.putObject(costed.form().word());
            Answerer.put(of, "footLength", step.footLength());
            Answerer.put(of, "vaultRadius", step.radius());
            Answerer.put(of, "stepFactor", costed.factor());
            Answerer.put(of, "workPerStep", work);
            Answerer.put(of, "workPerMetre", work / step.stepLength());
            Answerer.put(of, "costOfTransport", work / (mass * gravity * step.stepLength()));
            ArrayNode angles = of.putArray("transitionAngles");
            for (int i = 0; i < step.transitions(); i++) {
                angles.add(step.angle(i));
            }
        }
        return out;
    }

    private static ObjectNode crossover(QuestionInputs in) throws CallerError, LimitException {
        double segments = in.number("segments");
        double share = in.share("seriesShare", 1);
        ObjectNode out = object();
        putOrNull(out, "smallAngle", Crossover.equalVaults(WorkForm.NO_PUSH_SMALL_ANGLE, segments, share));
        for (WorkForm form : EXACT) {
            putOrNull(out, form.word(), Crossover.equalVaults(form, segments, share));
        }
        putOrNull(out, "optimumFoot", Crossover.optimumFoot(share));
        return out;
    }

    private static ObjectNode equalCost(QuestionInputs in) throws CallerError, LimitException {
        double segments = in.number("segments");
        double limbLength = in.number("limbLength");
        double factor = in.number("stepFactor");
        double share = in.share("seriesShare", 1);
        if (in.workForm().isPresent()) {
            return equalCost(in.workForm().get(), segments, limbLength, share, factor);
        }
        ObjectNode out = object();
        for (WorkForm form : in.workForms()) {
            try {
                out.set(form.word(), equalCost(form, segments, limbLength, share, factor));
            } catch (LimitException e) {
                if (e.limit() != Limit.NO_SOLUTION) {
                    throw e;
                }
                out.put(form.word(), e.limit().name());
            }
        }
        return out;
    }

    /** Each of the two steps has its code in its place where it alone has no value. */
    private static ObjectNode equalCost(WorkForm form, double segments, double limbLength, double share, double factor)
            throws LimitException {
        ObjectNode out = object();
        Optional<LimitException> failed = Optional.empty();
        try {
            describe(out.putObject("equal"), EqualCost.equalVaults(form, segments, limbLength, share, factor));
        } catch (LimitException e) {
            failed = Optional.of(e);
            out.put("equal", e.limit().name());
        }
        boolean alone = !(segments > 0);
        if (!alone) {
            try {
                VaultingStep optimum = EqualCost.optimumFoot(form, segments, limbLength, share, factor);
                describe(out.putObject("optimum"), optimum);
            } catch (LimitException e) {
                out.put("optimum", e.limit().name());
                alone = true;
            }
        }
        if (failed.isPresent() && alone) {
            throw failed.get();
        }
        return out;
    }

    private static void describe(ObjectNode node, VaultingStep step) {
        Answerer.put(node, "stepLength", step.stepLength());
        Answerer.put(node, "footLength", step.footLength());
        Answerer.put(node, "vaultRadius", step.radius());
    }

    private static ObjectNode halving(QuestionInputs in) throws CallerError, LimitException {
        double stepLength = in.number("stepLength");
        double limbLength = in.number("limbLength");
        VaultingStep.given(0, stepLength, limbLength, 0, 1);
        ObjectNode out = object();
        for (WorkForm form : EXACT) {
            putOrCode(out, form.word(), () -> Halving.ratio(form, stepLength, limbLength));
        }
        return out;
    }

    private static ObjectNode seriesShare(QuestionInputs in) throws CallerError, LimitException {
        if (in.workForm().isPresent()) {
            return seriesShare(in, in.workForm().get());
        }
        ObjectNode out = object();
        for (WorkForm form : in.workForms()) {
            out.set(form.word(), seriesShare(in, form));
        }
        return out;
    }

    private static ObjectNode seriesShare(QuestionInputs in, WorkForm form) throws CallerError, LimitException {
        double segments = in.number("segments");
        double stepLength = in.number("stepLength");
        double limbLength = in.number("limbLength");
        double share = in.share("seriesShare", 1);
        VaultingStep optimum = OptimumFoot.of(form, segments, stepLength, limbLength, share);
        double factor = optimum.factor(form);
        ObjectNode out = object();
        Answerer.put(out, "optimumFootLength", optimum.footLength());
        Answerer.put(out, "optimumStepFactor", factor);
        putOrCode(
                out,
                "equalStepFactor",
                () -> VaultingStep.equalVaults(segments, stepLength, limbLength, share)
                        .factor(form));
        Answerer.put(
                out,
                "optimumFootLengthSmallAngle",
                OptimumFoot.smallAngle(optimum.segments(), stepLength, limbLength, share));
        putOrCode(
                out,
                "optimumStepFactorSmallAngleNoPush",
                () -> OptimumFoot.of(WorkForm.NO_PUSH_SMALL_ANGLE, segments, stepLength, limbLength, share)
                        .factor(WorkForm.NO_PUSH_SMALL_ANGLE));
        try {
            putOrNull(out, "crossoverSmallAngle", Crossover.equalVaults(WorkForm.NO_PUSH_SMALL_ANGLE, segments, share));
        } catch (LimitException e) {
            out.put("crossoverSmallAngle", e.limit().name());
        }
        return out;
    }
}
