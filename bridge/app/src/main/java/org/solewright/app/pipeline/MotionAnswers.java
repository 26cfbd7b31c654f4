package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import org.solewright.analysis.cost.CollisionMeasures;
import org.solewright.analysis.cost.PowerWork;
import org.solewright.analysis.cost.VaultingStep;
import org.solewright.analysis.dynamics.DistalPower;
import org.solewright.analysis.dynamics.Limit;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.SyntheticWalk;
import org.solewright.analysis.dynamics.WalkParameters;
import org.solewright.domain.cost.WalkTruth;

/** The questions {@code collision.*}, {@code power.*} and {@code trial.*}. */
final class MotionAnswers {

    private MotionAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "collision.angles",
                Answerer.of(MotionAnswers::collision, "force", "velocity", "timeStep", "mass", "gravity"),
                "power.work",
                Answerer.of(MotionAnswers::work, "power", "timeStep"),
                "power.distal",
                Answerer.of(
                        MotionAnswers::distal, "force", "freeMoment", "comVelocity", "angularVelocity", "com", "cop"),
                "trial.synthetic",
                Answerer.of(
                        MotionAnswers::synthetic,
                        "mass",
                        "limbLength",
                        "segments",
                        "footLength",
                        "stepLength",
                        "referenceSpeed",
                        "stepBridgeShare",
                        "innerBridgeShare",
                        "gravity"));
    }

    private static ObjectNode distal(QuestionInputs in) throws CallerError {
        ObjectNode out = object();
        put(
                out,
                "power",
                DistalPower.of(
                        in.vector("force"),
                        in.vector("freeMoment"),
                        in.vector("comVelocity"),
                        in.vector("angularVelocity"),
                        in.vector("com"),
                        in.vector("cop")));
        return out;
    }

    private static ObjectNode collision(QuestionInputs in) throws CallerError, LimitException {
        double[] force = in.rows("force", 3);
        double[] velocity = in.rows("velocity", 3);
        if (force.length != velocity.length) {
            throw new CallerError(
                    CallerError.Code.WRONG_TYPE,
                    "inputs 'force' and 'velocity' have " + force.length / 3 + " and " + velocity.length / 3
                            + " samples, expected equal counts");
        }
        tooFew(force.length / 3);
        CollisionMeasures measures =
                CollisionMeasures.of(force, velocity, in.positive("timeStep"), in.positive("mass"), in.gravity());
        ObjectNode out = object();
        put(out, "collisionAngle", measures.collisionAngle());
        put(out, "forceAngle", measures.forceAngle());
        put(out, "velocityAngle", measures.velocityAngle());
        put(out, "collisionFraction", measures.collisionFraction());
        put(out, "mechanicalCostOfTransport", measures.mechanicalCostOfTransport());
        put(out, "costFromCollisionAngle", measures.costFromCollisionAngle());
        return out;
    }

    private static ObjectNode work(QuestionInputs in) throws CallerError, LimitException {
        double[] power = in.numbers("power");
        tooFew(power.length);
        PowerWork work = PowerWork.of(power, in.positive("timeStep"));
        ObjectNode out = object();
        put(out, "positiveWork", work.positive());
        put(out, "negativeWork", work.negative());
        return out;
    }

    private static void tooFew(int samples) throws LimitException {
        if (samples < 2) {
            throw new LimitException(Limit.TOO_FEW_POINTS, samples + " samples, expected at least 2");
        }
    }

    private static ObjectNode synthetic(QuestionInputs in) throws CallerError, LimitException {
        VaultingStep step = VaultingStep.given(
                in.number("segments"), in.number("stepLength"), in.number("limbLength"), in.number("footLength", 0), 1);
        WalkParameters walk = new WalkParameters(
                in.positive("mass"),
                step.limbLength(),
                step.segments(),
                step.footLength(),
                step.stepLength(),
                in.positive("referenceSpeed"),
                in.number("stepBridgeShare", WalkParameters.DEFAULT_STEP_BRIDGE_SHARE),
                in.number("innerBridgeShare", WalkParameters.DEFAULT_INNER_BRIDGE_SHARE),
                in.gravity());
        if (!(walk.topSpeedSquared() > 0)) {
            throw new LimitException(
                    Limit.APEX_NOT_CLEARED,
                    "squared speed " + walk.topSpeedSquared() + " m2/s2 at the top of a vault for "
                            + walk.referenceSpeed() + " m/s at the step, expected more than 0 m2/s2");
        }
        if (walk.leastVaultPush() < 0) {
            throw new LimitException(
                    Limit.TAKE_OFF,
                    "push of the limb over mass " + walk.leastVaultPush() + " m/s2 at the end of a vault for "
                            + walk.referenceSpeed() + " m/s at the step, expected 0 m/s2 or more");
        }
        return truth(new SyntheticWalk(walk).truth());
    }

    private static ObjectNode truth(WalkTruth truth) {
        ObjectNode out = object();
        put(out, "stepTime", truth.stepTime());
        put(out, "speed", truth.speed());
        put(out, "radius", truth.radius());
        put(out, "doubleSupport", truth.doubleSupport());
        ArrayNode pivots = out.putArray("pivots");
        for (WalkTruth.Place place : truth.pivots()) {
            pivots.addArray().add(place.x()).add(place.z());
        }
        ArrayNode transitions = out.putArray("transitions");
        for (WalkTruth.Transition transition : truth.transitions()) {
            transitions.add(transition(transition));
        }
        put(out, "leastLimbForce", truth.leastLimbForce());
        out.put("copMonotone", truth.centreOfPressureMonotone());
        return out;
    }

    private static ObjectNode transition(WalkTruth.Transition transition) {
        ObjectNode out = object();
        if (transition instanceof WalkTruth.Step step) {
            out.put("kind", "step");
            put(out, "trailingPositive", step.trailingPositive());
            put(out, "trailingNegative", step.trailingNegative());
            put(out, "leadingPositive", step.leadingPositive());
            put(out, "leadingNegative", step.leadingNegative());
            put(out, "combinedPositive", step.combinedPositive());
        } else if (transition instanceof WalkTruth.Inner inner) {
            out.put("kind", "inner");
            put(out, "pos", inner.positive());
            put(out, "neg", inner.negative());
        }
        WalkTruth.Impulsive impulsive = transition.impulsive();
        put(out, "duration", transition.duration());
        put(out, "speed", impulsive.speed());
        put(out, "angle", impulsive.angle());
        put(out, "impulsivePushOff", impulsive.pushOff());
        put(out, "impulsiveSimultaneous", impulsive.simultaneous());
        put(out, "impulsiveCombined", impulsive.combined());
        put(out, "impulsiveNoPush", impulsive.noPush());
        return out;
    }
}
