package org.solewright.formats.export;

import java.io.ByteArrayInputStream;
import java.net.URI;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.TimeoutException;
import javax.xml.transform.sax.SAXSource;
import net.sf.saxon.Configuration;
import net.sf.saxon.lib.EnvironmentVariableResolver;
import net.sf.saxon.lib.Feature;
import net.sf.saxon.s9api.Processor;
import net.sf.saxon.s9api.SaxonApiException;
import net.sf.saxon.s9api.Serializer;
import net.sf.saxon.s9api.XdmNode;
import net.sf.saxon.s9api.XmlProcessingError;
import net.sf.saxon.s9api.Xslt30Transformer;
import net.sf.saxon.s9api.XsltCompiler;
import net.sf.saxon.s9api.XsltExecutable;
import net.sf.saxon.trans.UncheckedXPathException;
import net.sf.saxon.trans.XPathException;
import net.sf.saxon.value.DateTimeValue;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.foot.FootModel;
import org.solewright.formats.io.ClosedXml;
import org.solewright.formats.io.FormatException;
import org.xml.sax.InputSource;

/**
 * Runs a template on a model. It can open no file but stylesheets of its own folder, call no function of Java, write no
 * file, and is stopped when it takes too long, nests too deep or writes too much. The same model and template give the
 * same bytes; the current time is for a template always the beginning of 1970.
 */
public final class TemplateExport {

    /** How long a template may run. */
    static final Duration LONGEST = Duration.ofSeconds(20);

    private static final int LARGEST_OUTPUT = 64 << 20;
    private static final long STACK_BYTES = 16L << 20;
    private static final int MOST_MESSAGES = 20;
    private static final int LONGEST_TEXT = 300;
    private static final String CORRECT = "correct the template";
    private static final String ENDLESS = "look for a recursion or loop without end";

    private final Template template;
    private final Duration longest;
    private final Sandbox sandbox;
    private final BoundedOutput output = new BoundedOutput(LARGEST_OUTPUT);
    private final List<Finding> findings = new ArrayList<>();
    private Optional<XmlProcessingError> firstError = Optional.empty();
    private String lastMessage = "";

    private TemplateExport(Template template, Duration longest) {
        this.template = template;
        this.longest = longest;
        this.sandbox = new Sandbox(template);
    }

    /**
     * Checks a model, runs the template on it and checks what it wrote.
     *
     * @param template what to write
     * @param model for the checks
     * @param xml the same model's XML, namespace {@code urn:solewright:foot-model:1}
     * @return the output, empty where findings of the model are errors; with findings
     * @throws FormatException where the template is not in order or does what it may not
     */
    public static Exported run(Template template, FootModel model, byte[] xml) throws FormatException {
        return run(template, model, xml, LONGEST);
    }

    static Exported run(Template template, FootModel model, byte[] xml, Duration longest) throws FormatException {
        List<Finding> wrong = ModelChecks.of(model);
        if (!wrong.isEmpty()) {
            return new Exported(new byte[0], wrong);
        }
        TemplateExport export = new TemplateExport(template, longest);
        byte[] content = export.transformed(xml);
        List<Finding> findings = new ArrayList<>(export.findings);
        findings.addAll(OutputChecks.of(content));
        return new Exported(content, findings);
    }

    private byte[] transformed(byte[] xml) throws FormatException {
        FutureTask<Boolean> task = new FutureTask<>(() -> transform(xml));
        Thread worker = new Thread(null, task, "template", STACK_BYTES);
        worker.setDaemon(true);
        worker.start();
        try {
            task.get(longest.toMillis(), TimeUnit.MILLISECONDS);
        } catch (TimeoutException e) {
            throw refused("the template ran longer than " + longest.toSeconds() + " s", ENDLESS, e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw refused("the template was interrupted", "run it again", e);
        } catch (ExecutionException e) {
            throw failure(e.getCause() == null ? e : e.getCause());
        } finally {
            // Ends a worker that still writes; one that only reckons ends with the process.
            output.abandon();
        }
        Optional<FormatException> refusal = sandbox.refusal();
        if (refusal.isPresent()) {
            throw refusal.get();
        }
        return output.content();
    }

    /** In the worker's thread. */
    private boolean transform(byte[] xml) throws SaxonApiException, XPathException {
        Processor processor = new Processor(closed());
        XsltCompiler compiler = processor.newXsltCompiler();
        compiler.setErrorReporter(this::report);
        XsltExecutable stylesheet =
                compiler.compile(Sandbox.stylesheet(template.content(), Sandbox.BASE + "template.xsl"));
        InputSource input = new InputSource(new ByteArrayInputStream(xml));
        input.setSystemId("model:/model.xml");
        XdmNode document = processor.newDocumentBuilder().build(new SAXSource(ClosedXml.reader(), input));
        Xslt30Transformer transformer = stylesheet.load30();
        transformer.setErrorReporter(this::report);
        transformer.setMessageHandler(m -> heard(m.getStringValue().strip().replaceAll("\\s+", " "), m.isTerminate()));
        transformer.setResultDocumentHandler(uri -> {
            throw new UncheckedXPathException(sandbox.refuse("writes a second document '" + name(uri) + "'"));
        });
        transformer.getUnderlyingController().setCurrentDateTime(DateTimeValue.EPOCH);
        transformer.setGlobalContextItem(document);
        Serializer serializer = stylesheet.load30().newSerializer(output);
        transformer.applyTemplates(document, serializer);
        return true;
    }

    private Configuration closed() {
        Configuration configuration = Configuration.newConfiguration();
        configuration.setConfigurationProperty(Feature.ALLOW_EXTERNAL_FUNCTIONS, false);
        configuration.setConfigurationProperty(Feature.DISABLE_XSL_EVALUATE, true);
        configuration.setConfigurationProperty(Feature.ENVIRONMENT_VARIABLE_RESOLVER, NoEnvironment.INSTANCE);
        configuration.setResourceResolver(sandbox);
        configuration.setUnparsedTextURIResolver((uri, encoding, config) -> {
            throw sandbox.refuse("opens '" + name(uri) + "'");
        });
        configuration.setCollectionFinder((context, uri) -> {
            throw sandbox.refuse("opens the collection '" + (uri == null ? "" : uri) + "'");
        });
        return configuration;
    }

    /** As the template has it, where it can be told: without the base that stands for its folder. */
    private static String name(URI uri) {
        String text = uri.toString();
        return text.startsWith(Sandbox.BASE) ? text.substring(Sandbox.BASE.length()) : text;
    }

    private synchronized void report(XmlProcessingError error) {
        if (!error.isWarning() && firstError.isEmpty()) {
            firstError = Optional.of(error);
        } else if (error.isWarning()) {
            note(place(error) + error.getMessage());
        }
    }

    private synchronized void heard(String message, boolean isLast) {
        if (isLast) {
            lastMessage = message;
        } else {
            note(message);
        }
    }

    private void note(String message) {
        if (findings.size() < MOST_MESSAGES) {
            findings.add(Finding.note("export.template-message", template.source(), shortened(message)));
        }
    }

    private synchronized FormatException failure(Throwable cause) {
        Optional<FormatException> refusal = sandbox.refusal();
        if (refusal.isPresent()) {
            return refusal.get();
        }
        if (output.isFull()) {
            return refused("the template writes more than " + LARGEST_OUTPUT + " bytes", ENDLESS, cause);
        }
        if (cause instanceof StackOverflowError
                || String.valueOf(cause.getMessage()).contains("nested function calls")) {
            return refused("the template calls itself too deep", ENDLESS, cause);
        }
        if (cause instanceof OutOfMemoryError) {
            return refused("the template needs more memory than this run may take", ENDLESS, cause);
        }
        if (!lastMessage.isEmpty()) {
            return refused("the template stopped with '" + shortened(lastMessage) + "'", CORRECT, cause);
        }
        String text = firstError.map(e -> place(e) + e.getMessage()).orElse(String.valueOf(cause.getMessage()));
        if (text.contains("xsl:result-document is disabled")) {
            return refused(
                    "the template writes a second document (xsl:result-document), which is not allowed",
                    "write everything to the one output",
                    cause);
        }
        return refused(shortened(text.strip().replaceAll("\\s+", " ").replaceAll("\\.$", "")), CORRECT, cause);
    }

    private static String place(XmlProcessingError error) {
        int line = error.getLocation().getLineNumber();
        return line > 0 ? "line " + line + ": " : "";
    }

    private static String shortened(String text) {
        return text.length() <= LONGEST_TEXT ? text : text.substring(0, LONGEST_TEXT) + " ...";
    }

    private FormatException refused(String what, String whatToDo, Throwable cause) {
        return new FormatException(template.source(), what, whatToDo, cause);
    }

    /** Variables of the environment are none of a template's business. */
    private enum NoEnvironment implements EnvironmentVariableResolver {
        INSTANCE;

        @Override
        public Set<String> getAvailableEnvironmentVariables() {
            return Set.of();
        }

        @Override
        public @Nullable String getEnvironmentVariable(String name) {
            return null;
        }
    }
}
