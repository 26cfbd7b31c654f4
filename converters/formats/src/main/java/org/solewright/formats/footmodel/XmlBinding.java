package org.solewright.formats.footmodel;

import jakarta.xml.bind.JAXBContext;
import jakarta.xml.bind.JAXBException;
import jakarta.xml.bind.Marshaller;
import jakarta.xml.bind.Unmarshaller;
import jakarta.xml.bind.UnmarshallerHandler;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.net.URL;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Objects;
import javax.xml.XMLConstants;
import javax.xml.validation.Schema;
import javax.xml.validation.SchemaFactory;
import javax.xml.validation.ValidatorHandler;
import org.solewright.formats.io.ClosedXml;
import org.solewright.formats.io.FormatException;
import org.xml.sax.ErrorHandler;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;
import org.xml.sax.SAXParseException;

/**
 * Reads and writes one kind of XML file: bytes to generated classes and back, past the guard and the schema in one go.
 * Nothing outside the file is opened.
 *
 * @param <T> generated class of the root element
 */
final class XmlBinding<T> {

    private static final int LARGEST_BYTES = 32 << 20;
    private static final String CORRECT = "correct the file against its schema";

    private final Class<T> root;
    private final String rootName;
    private final String namespace;
    private final List<KnownWords> words;
    private final JAXBContext context;
    private final Schema schema;

    /**
     * What was read, with the line each element stands on.
     *
     * @param root the generated object of the root element
     * @param source the file's name for messages
     * @param lines line by generated object
     * @param <T> generated class of the root element
     */
    record Parsed<T>(T root, String source, IdentityHashMap<Object, Integer> lines) {

        FormatException wrong(Object element, String message) {
            return new FormatException(source, place(element) + message, CORRECT);
        }

        FormatException wrong(Object element, String message, Throwable cause) {
            return new FormatException(source, place(element) + message, CORRECT, cause);
        }

        private String place(Object element) {
            Integer line = lines.get(element);
            return line == null ? "" : "line " + line + ": ";
        }
    }

    XmlBinding(Class<T> root, String rootName, String namespace, String schemaFile, List<KnownWords> words) {
        this.root = root;
        this.rootName = rootName;
        this.namespace = namespace;
        this.words = List.copyOf(words);
        try {
            context = JAXBContext.newInstance(root);
            SchemaFactory factory = SchemaFactory.newInstance(XMLConstants.W3C_XML_SCHEMA_NS_URI);
            factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
            factory.setProperty(XMLConstants.ACCESS_EXTERNAL_DTD, "");
            factory.setProperty(XMLConstants.ACCESS_EXTERNAL_SCHEMA, "");
            URL url = Objects.requireNonNull(XmlBinding.class.getResource(schemaFile), schemaFile);
            schema = factory.newSchema(url);
        } catch (JAXBException | SAXException e) {
            throw new IllegalStateException("schema " + schemaFile + " or its classes are not in order", e);
        }
    }

    Parsed<T> read(Path file) throws IOException, FormatException {
        byte[] bytes;
        try (InputStream in = Files.newInputStream(file)) {
            bytes = in.readNBytes(LARGEST_BYTES + 1);
        }
        return parse(file.toString(), bytes);
    }

    Parsed<T> parse(String source, byte[] bytes) throws FormatException {
        if (bytes.length == 0) {
            throw new FormatException(
                    source,
                    "the file is empty, expected XML with root element '" + rootName + "'",
                    "give another file");
        }
        if (bytes.length > LARGEST_BYTES) {
            throw new FormatException(
                    source, "the file is larger than " + LARGEST_BYTES + " bytes", "give a file of that kind");
        }
        XmlGuard guard = new XmlGuard(ClosedXml.reader(), rootName, namespace, words);
        IdentityHashMap<Object, Integer> lines = new IdentityHashMap<>();
        try {
            UnmarshallerHandler binder = binder(guard, lines);
            ValidatorHandler validator = schema.newValidatorHandler();
            validator.setErrorHandler(Strict.INSTANCE);
            validator.setContentHandler(binder);
            guard.setContentHandler(validator);
            guard.setErrorHandler(Strict.INSTANCE);
            guard.parse(new InputSource(new ByteArrayInputStream(bytes)));
            return new Parsed<>(root.cast(binder.getResult()), source, lines);
        } catch (SAXParseException e) {
            throw refused(source, guard, e);
        } catch (SAXException | JAXBException | IOException e) {
            throw new FormatException(
                    source,
                    "line " + guard.line() + ": " + SchemaMessage.english(String.valueOf(e.getMessage())),
                    CORRECT,
                    e);
        }
    }

    byte[] render(T content) {
        try {
            Marshaller marshaller = context.createMarshaller();
            marshaller.setProperty(Marshaller.JAXB_FORMATTED_OUTPUT, true);
            marshaller.setProperty(Marshaller.JAXB_ENCODING, StandardCharsets.UTF_8.name());
            ByteArrayOutputStream out = new ByteArrayOutputStream();
            marshaller.marshal(content, out);
            byte[] bytes = out.toByteArray();
            parse(rootName, bytes);
            return bytes;
        } catch (JAXBException | FormatException e) {
            throw new IllegalStateException("what is to be written is not as its schema says: " + e.getMessage(), e);
        }
    }

    private UnmarshallerHandler binder(XmlGuard guard, IdentityHashMap<Object, Integer> lines) throws JAXBException {
        Unmarshaller unmarshaller = context.createUnmarshaller();
        unmarshaller.setListener(new Unmarshaller.Listener() {
            @Override
            public void beforeUnmarshal(Object target, Object parent) {
                lines.put(target, guard.line());
            }
        });
        return unmarshaller.getUnmarshallerHandler();
    }

    private static FormatException refused(String source, XmlGuard guard, SAXParseException e) {
        String place = "line " + Math.max(1, e.getLineNumber()) + ": ";
        if (e instanceof XmlGuard.Refusal r) {
            return new FormatException(source, place + r.getMessage(), r.whatToDo(), e);
        }
        String text = SchemaMessage.english(String.valueOf(e.getMessage()));
        if (text.contains("DOCTYPE")) {
            return new FormatException(
                    source, place + "a document type declaration, expected none", "remove the DOCTYPE", e);
        }
        if (!guard.isRootSeen()) {
            return new FormatException(source, place + "not XML (" + text + ")", "give an XML file", e);
        }
        return new FormatException(source, place + text, CORRECT, e);
    }

    /** Every departure ends the reading. */
    private enum Strict implements ErrorHandler {
        INSTANCE;

        @Override
        public void warning(SAXParseException e) throws SAXException {
            throw e;
        }

        @Override
        public void error(SAXParseException e) throws SAXException {
            throw e;
        }

        @Override
        public void fatalError(SAXParseException e) throws SAXException {
            throw e;
        }
    }
}
