package org.solewright.app.pipeline;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.CharConversionException;
import java.io.IOException;
import java.io.InputStream;
import org.jspecify.annotations.Nullable;
import org.solewright.formats.io.FormatException;

/**
 * A file of questions, read one by one: a question, an array of them, or an object with an array {@code records}. It is
 * checked as a whole first, so that nothing is answered of a file that is broken at its end.
 */
final class QuestionFile {

    private static final int DEEPEST = 100;
    private static final String EXPECTED = "give one question, an array of questions, or {\"records\": [...]}";
    private static final String RECORDS = "records";

    /** Opens the file's bytes; called twice. */
    @FunctionalInterface
    interface Bytes {
        InputStream open() throws IOException;
    }

    /** Takes the questions in their order. */
    @FunctionalInterface
    interface Taker {
        void take(JsonNode question) throws IOException;
    }

    private enum Shape {
        ARRAY,
        RECORDS,
        ONE
    }

    private final String source;
    private final Bytes bytes;
    private final JsonMapper mapper;
    private final Shape shape;

    private QuestionFile(String source, Bytes bytes, JsonMapper mapper, Shape shape) {
        this.source = source;
        this.bytes = bytes;
        this.mapper = mapper;
        this.shape = shape;
    }

    /**
     * Checks a file.
     *
     * @param source its name
     * @param bytes its content
     * @return the file, to be read
     * @throws FormatException where it is not JSON of one of the shapes
     * @throws IOException where it cannot be read
     */
    static QuestionFile of(String source, Bytes bytes) throws IOException, FormatException {
        JsonMapper mapper = JsonMapper.builder(JsonFactory.builder()
                        .streamReadConstraints(StreamReadConstraints.builder()
                                .maxNestingDepth(DEEPEST)
                                .build())
                        .build())
                .build();
        try (JsonParser in = mapper.createParser(bytes.open())) {
            in.enable(JsonParser.Feature.STRICT_DUPLICATE_DETECTION);
            Shape shape = shape(source, in);
            if (in.nextToken() != null) {
                throw new FormatException(
                        source, place(in.currentLocation()) + "text after the end of the JSON", EXPECTED);
            }
            return new QuestionFile(source, bytes, mapper, shape);
        } catch (JsonProcessingException e) {
            throw new FormatException(
                    source,
                    place(e.getLocation()) + "not JSON (" + QuestionInputs.shown(e.getOriginalMessage()) + ")",
                    EXPECTED,
                    e);
        } catch (CharConversionException e) {
            throw new FormatException(
                    source,
                    "not JSON (" + QuestionInputs.shown(String.valueOf(e.getMessage())) + ")",
                    "save the file as UTF-8",
                    e);
        }
    }

    private static String place(@Nullable JsonLocation at) {
        return at == null || at.getLineNr() < 1 ? "" : "line " + at.getLineNr() + ", column " + at.getColumnNr() + ": ";
    }

    private static Shape shape(String source, JsonParser in) throws IOException, FormatException {
        JsonToken first = in.nextToken();
        if (first == null) {
            throw new FormatException(source, "the file is empty", EXPECTED);
        }
        if (first == JsonToken.START_ARRAY) {
            in.skipChildren();
            return Shape.ARRAY;
        }
        if (first != JsonToken.START_OBJECT) {
            throw new FormatException(source, "the file holds " + kind(first) + ", expected questions", EXPECTED);
        }
        Shape shape = Shape.ONE;
        while (in.nextToken() == JsonToken.FIELD_NAME) {
            boolean isRecords = in.currentName().equals(RECORDS);
            JsonToken value = in.nextToken();
            if (isRecords && value != JsonToken.START_ARRAY) {
                throw new FormatException(source, "\"records\" is " + kind(value) + ", expected questions", EXPECTED);
            }
            shape = isRecords ? Shape.RECORDS : shape;
            in.skipChildren();
        }
        return shape;
    }

    private static String kind(JsonToken token) {
        return switch (token) {
            case START_OBJECT -> "an object";
            case START_ARRAY -> "a list";
            case VALUE_STRING -> "a text";
            case VALUE_NULL -> "null";
            default -> "a value";
        };
    }

    /** Reads the questions in their order. */
    void forEach(Taker taker) throws IOException {
        try (JsonParser in = mapper.createParser(bytes.open())) {
            in.nextToken();
            if (shape == Shape.ONE) {
                taker.take(mapper.readTree(in));
                return;
            }
            if (shape == Shape.RECORDS) {
                while (in.nextToken() == JsonToken.FIELD_NAME
                        && !in.currentName().equals(RECORDS)) {
                    in.nextToken();
                    in.skipChildren();
                }
                in.nextToken();
            }
            while (in.nextToken() != JsonToken.END_ARRAY) {
                taker.take(mapper.readTree(in));
            }
        } catch (JsonProcessingException e) {
            throw new IOException(source + " changed while it was read", e);
        }
    }
}
