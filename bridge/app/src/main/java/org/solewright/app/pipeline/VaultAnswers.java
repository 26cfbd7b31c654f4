package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Map;
import org.solewright.analysis.cost.PivotPolygon;
import org.solewright.analysis.cost.PushOffPolicy;
import org.solewright.analysis.cost.RimlessWheel;
import org.solewright.analysis.cost.VaultingGait;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.Vault;
import org.solewright.domain.cost.WorkForm;

/** The questions {@code vault.*}. */
final class VaultAnswers {

    private VaultAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "vault.duration",
                Answerer.of(VaultAnswers::duration, "radius", "startLean", "endLean", "startRate", "slope", "gravity"),
                "vault.level-gait",
                Answerer.of(
                        VaultAnswers::levelGait,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "footLength",
                        "footRule",
                        "workForm",
                        "seriesShare",
                        "meanSpeed",
                        "mass",
                        "pushOffPolicy",
                        "gravity"),
                "vault.passive-gait",
                Answerer.of(
                        VaultAnswers::passiveGait,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "footLength",
                        "footRule",
                        "workForm",
                        "seriesShare",
                        "slope",
                        "gravity"),
                "vault.rimless-wheel",
                Answerer.of(VaultAnswers::rimlessWheel, "spokes", "slope", "inertiaRatio", "spokeLength", "gravity"),
                "vault.polygon-step",
                Answerer.of(
                        VaultAnswers::polygonStep,
                        "pivots",
                        "stepLength",
                        "startSpeed",
                        "mass",
                        "pushOffPolicy",
                        "gravity"),
                "vault.speed-window",
                Answerer.of(
                        VaultAnswers::speedWindow,
                        "segments",
                        "stepLength",
                        "limbLength",
                        "footLength",
                        "footRule",
                        "workForm",
                        "seriesShare",
                        "gravity"));
    }

    private static VaultingStep step(QuestionInputs in) throws CallerError, LimitException {
        return TransitionAnswers.step(in, in.workForm().orElse(WorkForm.PUSH_OFF));
    }

    private static PushOffPolicy policy(QuestionInputs in) throws CallerError, LimitException {
        return PushOffPolicy.ofWord(in.word("pushOffPolicy").orElse(PushOffPolicy.ALL.word()));
    }

    private static ObjectNode duration(QuestionInputs in) throws CallerError, LimitException {
        double radius = in.number("radius");
        double start = in.angle("startLean");
        double end = in.angle("endLean");
        double rate = in.number("startRate");
        double slope = in.angle("slope", 0);
        double gravity = in.gravity();
        ObjectNode out = object();
        put(out, "duration", Vault.duration(radius, gravity, start, end, rate, slope));
        put(out, "endRate", Vault.endRate(radius, gravity, start, end, rate, slope));
        return out;
    }

    private static ObjectNode levelGait(QuestionInputs in) throws CallerError, LimitException {
        VaultingStep step = step(in);
        PushOffPolicy policy = policy(in);
        double gravity = in.gravity();
        double meanSpeed = in.positive("meanSpeed");
        double mass = in.positive("mass");
        VaultingGait gait = VaultingGait.level(step, meanSpeed, policy, gravity);
        VaultingGait.SpeedWindow window = VaultingGait.window(step, gravity);
        ObjectNode out = object();
        put(out, "startSpeed", gait.startSpeed());
        put(out, "stepTime", gait.stepTime());
        put(out, "pushOffWork", mass * gait.pushOffWork());
        put(out, "collisionLoss", mass * gait.collisionLoss());
        transitions(out.putArray("transitions"), gait.transitions(), mass);
        put(out, "quasiSteadyPushOffWork", step.factor(WorkForm.PUSH_OFF) * mass * meanSpeed * meanSpeed / 2);
        ArrayNode limits = out.putArray("startSpeedLimits");
        limits.add(window.least());
        limits.add(window.greatest());
        return out;
    }

    private static void transitions(ArrayNode out, List<VaultingGait.Transition> transitions, double mass) {
        for (VaultingGait.Transition t : transitions) {
            ObjectNode node = out.addObject();
            put(node, "speedBefore", t.speedBefore());
            put(node, "speedAfter", t.speedAfter());
            put(node, "angle", t.angle());
            put(node, "pushOffWork", mass * t.pushOffWork());
            put(node, "collisionLoss", mass * t.collisionLoss());
            put(node, "pushImpulse", t.pushImpulse());
            put(node, "collisionImpulse", t.collisionImpulse());
        }
    }

    private static ObjectNode passiveGait(QuestionInputs in) throws CallerError, LimitException {
        VaultingStep step = step(in);
        double slope = in.angle("slope");
        double gravity = in.gravity();
        VaultingGait gait = VaultingGait.passive(step, slope, gravity);
        ObjectNode out = object();
        put(out, "startSpeed", gait.startSpeed());
        put(out, "eigenvalue", VaultingGait.passiveEigenvalue(step));
        put(out, "stepTime", gait.stepTime());
        put(out, "lossPerMass", gait.collisionLoss());
        put(out, "gravityWorkPerMass", gravity * step.stepLength() * Math.sin(slope));
        ArrayNode before = out.putArray("speedBefore");
        gait.transitions().forEach(t -> before.add(t.speedBefore()));
        return out;
    }

    private static ObjectNode rimlessWheel(QuestionInputs in) throws CallerError, LimitException {
        RimlessWheel wheel = RimlessWheel.of(
                in.number("spokes"),
                in.angle("slope"),
                in.positiveShare("inertiaRatio", 1),
                in.number("spokeLength"),
                in.gravity());
        ObjectNode out = object();
        put(out, "rateRatio", wheel.rateRatio());
        put(out, "rateBefore", wheel.rateBefore());
        put(out, "rateAfter", wheel.rateAfter());
        put(out, "eigenvalue", wheel.eigenvalue());
        out.put("clearsApex", wheel.clearsApex());
        out.put("staysDown", wheel.staysDown());
        put(out, "leastSlope", wheel.leastSlope());
        wheel.period().ifPresent(p -> put(out, "period", p));
        return out;
    }

    private static ObjectNode polygonStep(QuestionInputs in) throws CallerError, LimitException {
        PivotPolygon foot = PivotPolygon.of(in.rows("pivots", 2), in.number("stepLength"));
        PushOffPolicy policy = policy(in);
        double mass = in.positive("mass");
        VaultingGait gait = VaultingGait.polygon(foot, in.positive("startSpeed"), policy, in.gravity());
        ObjectNode out = object();
        put(out, "stepTime", gait.stepTime());
        put(out, "pushOffWork", mass * gait.pushOffWork());
        put(out, "endSpeed", gait.endSpeed());
        transitions(out.putArray("transitions"), gait.transitions(), mass);
        return out;
    }

    private static ObjectNode speedWindow(QuestionInputs in) throws CallerError, LimitException {
        VaultingStep step = step(in);
        double gravity = in.gravity();
        VaultingGait.SpeedWindow window = VaultingGait.window(step, gravity);
        ObjectNode out = object();
        put(out, "leastStartSpeed", window.least());
        put(out, "greatestStartSpeed", window.greatest());
        put(out, "greatestFroude", window.greatest() * window.greatest() / (gravity * step.radius()));
        return out;
    }
}
