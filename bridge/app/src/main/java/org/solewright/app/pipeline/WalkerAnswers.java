package org.solewright.app.pipeline;

import static org.solewright.app.pipeline.Answerer.object;
import static org.solewright.app.pipeline.Answerer.put;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import org.solewright.analysis.dynamics.LimitException;
import org.solewright.analysis.dynamics.SimplestWalker;
import org.solewright.analysis.dynamics.WalkerGait;

/** The questions {@code walker.*}. */
final class WalkerAnswers {

    private WalkerAnswers() {}

    static Map<String, Answerer> all() {
        return Map.of(
                "walker.passive",
                Answerer.of(WalkerAnswers::passive, "slope", "rollingRatio", "hipStiffness", "pushImpulse", "gait"),
                "walker.powered",
                Answerer.of(WalkerAnswers::powered, "slope", "rollingRatio", "hipStiffness", "halfAngle", "gait"),
                "walker.target",
                Answerer.of(WalkerAnswers::target, "speed", "stepLength", "rollingRatio"),
                "walker.period-doubling",
                Answerer.of(WalkerAnswers::periodDoubling, "rollingRatio", "hipStiffness"));
    }

    private static SimplestWalker.Gait gait(QuestionInputs in) throws CallerError {
        String word = in.word("gait").orElse("long");
        return switch (word) {
            case "long" -> SimplestWalker.Gait.LONG;
            case "short" -> SimplestWalker.Gait.SHORT;
            default ->
                throw new CallerError(
                        CallerError.Code.WRONG_TYPE,
                        "input 'gait' is \"" + QuestionInputs.shown(word) + "\", expected long or short");
        };
    }

    private static ObjectNode passive(QuestionInputs in) throws CallerError, LimitException {
        SimplestWalker.Gait kind = gait(in);
        double slope = in.angle("slope");
        double ratio = in.number("rollingRatio", 0);
        double stiffness = in.number("hipStiffness", 0);
        WalkerGait gait = SimplestWalker.passive(kind, slope, ratio, stiffness, in.number("pushImpulse", 0));
        ObjectNode out = object();
        common(out, gait);
        put(out, "leadingStepTime", SimplestWalker.leadingStepTime(kind, ratio, stiffness));
        put(out, "leadingHalfAngle", SimplestWalker.leadingHalfAngle(kind, slope, ratio, stiffness));
        return out;
    }

    private static ObjectNode powered(QuestionInputs in) throws CallerError, LimitException {
        SimplestWalker.Gait kind = gait(in);
        double ratio = in.number("rollingRatio", 0);
        double stiffness = in.number("hipStiffness", 0);
        WalkerGait gait = SimplestWalker.powered(kind, in.angle("slope", 0), ratio, stiffness, in.number("halfAngle"));
        ObjectNode out = object();
        common(out, gait);
        put(out, "pushImpulse", gait.pushImpulse());
        put(out, "leadingStepTime", SimplestWalker.leadingStepTime(kind, ratio, stiffness));
        return out;
    }

    private static void common(ObjectNode out, WalkerGait gait) {
        put(out, "halfAngle", gait.halfAngle());
        put(out, "stanceRate", gait.stanceRate());
        put(out, "swingRate", gait.swingRate());
        put(out, "stepTime", gait.stepTime());
        put(out, "stepLength", gait.stepLength());
        put(out, "speed", gait.speed());
        put(out, "speedBefore", gait.speedBefore());
        put(out, "speedAfter", gait.speedAfter());
        put(out, "transitionAngle", gait.transitionAngle());
        put(out, "pushOffWork", gait.pushOffWork());
        put(out, "collisionLoss", gait.collisionLoss());
        double[] eigenvalues = gait.eigenvalues();
        ArrayNode list = out.putArray("eigenvalues");
        list.addArray().add(eigenvalues[0]).add(eigenvalues[1]);
        list.addArray().add(eigenvalues[2]).add(eigenvalues[3]);
    }

    private static ObjectNode target(QuestionInputs in) throws CallerError, LimitException {
        WalkerGait gait =
                SimplestWalker.target(in.positive("speed"), in.number("stepLength"), in.number("rollingRatio", 0));
        ObjectNode out = object();
        put(out, "hipStiffness", gait.hipStiffness());
        put(out, "pushImpulse", gait.pushImpulse());
        put(out, "halfAngle", gait.halfAngle());
        put(out, "stanceRate", gait.stanceRate());
        put(out, "pushOffWork", gait.pushOffWork());
        put(out, "stepTime", gait.stepTime());
        return out;
    }

    private static ObjectNode periodDoubling(QuestionInputs in) throws CallerError, LimitException {
        SimplestWalker.Doubling doubling =
                SimplestWalker.periodDoubling(in.number("rollingRatio", 0), in.number("hipStiffness", 0));
        ObjectNode out = object();
        put(out, "slope", doubling.slope());
        put(out, "halfAngle", doubling.gait().halfAngle());
        return out;
    }
}
