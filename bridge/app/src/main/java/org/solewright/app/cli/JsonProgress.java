package org.solewright.app.cli;

import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.PrintWriter;
import org.solewright.app.study.StudyListener;

/** One JSON event a line, for scripts. */
final class JsonProgress implements StudyListener {

    private final PrintWriter err;
    private final JsonMapper mapper = new JsonMapper();
    private int tasks;
    private int ended;

    JsonProgress(PrintWriter err) {
        this.err = err;
    }

    @Override
    public void begin(String what, int count) {
        tasks = count;
        ended = 0;
        ObjectNode event = event("begin");
        event.put("what", what);
        event.put("tasks", count);
        err.println(event);
    }

    @Override
    public void ended(String kind, String name, String state, String message) {
        ended++;
        ObjectNode event = event("ended");
        event.put("what", kind);
        event.put("name", name);
        event.put("state", state);
        if (!message.isEmpty()) {
            event.put("message", message);
        }
        event.put("done", ended);
        event.put("of", tasks);
        err.println(event);
    }

    private ObjectNode event(String word) {
        return mapper.createObjectNode().put("event", word);
    }

    @Override
    public void finished() {
        err.println(event("finished"));
    }
}
