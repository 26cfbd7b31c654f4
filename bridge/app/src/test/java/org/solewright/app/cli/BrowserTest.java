package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.logging.Level;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.openqa.selenium.By;
import org.openqa.selenium.Dimension;
import org.openqa.selenium.Keys;
import org.openqa.selenium.OutputType;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.chrome.ChromeDriver;
import org.openqa.selenium.chrome.ChromeDriverService;
import org.openqa.selenium.chrome.ChromeOptions;
import org.openqa.selenium.logging.LogEntry;
import org.openqa.selenium.logging.LogType;
import org.openqa.selenium.logging.LoggingPreferences;

/** Opens the demo's pages in a real browser; skipped where chromium and its driver are not installed. */
class BrowserTest extends DemoCalls {

    private static final Path BROWSER = Path.of("/usr/bin/chromium");
    private static final Path DRIVER = Path.of("/usr/bin/chromedriver");
    private static final Pattern REQUEST = Pattern.compile("\"url\":\"([^\"]+)\"");

    private static final List<ChromeDriver> OPEN = new ArrayList<>();

    @BeforeAll
    static void openBrowser() {
        assumeTrue(
                Files.isExecutable(BROWSER) && Files.isExecutable(DRIVER),
                "chromium and chromium-driver are not installed: pages are not opened in a browser");
        ChromeOptions options = new ChromeOptions();
        options.setBinary(BROWSER.toFile());
        options.addArguments(
                "--headless=new",
                "--no-sandbox",
                "--disable-dev-shm-usage",
                "--use-angle=swiftshader",
                "--enable-unsafe-swiftshader",
                "--window-size=1300,1000");
        LoggingPreferences logs = new LoggingPreferences();
        logs.enable(LogType.BROWSER, Level.ALL);
        logs.enable(LogType.PERFORMANCE, Level.ALL);
        options.setCapability("goog:loggingPrefs", logs);
        OPEN.add(new ChromeDriver(
                new ChromeDriverService.Builder()
                        .usingDriverExecutable(DRIVER.toFile())
                        .build(),
                options));
    }

    @AfterAll
    static void closeBrowser() {
        OPEN.forEach(ChromeDriver::quit);
        OPEN.clear();
    }

    private static ChromeDriver open(String page) {
        ChromeDriver browser = OPEN.get(0);
        browser.manage().logs().get(LogType.BROWSER);
        browser.manage().logs().get(LogType.PERFORMANCE);
        browser.get(demo.resolve(page).toUri().toString());
        return browser;
    }

    @ParameterizedTest
    @ValueSource(strings = {"posture-cost.html", "foot-model-right.html", "foot-model-left.html"})
    void pagesOpenWithoutComplaintAndWithoutRequests(String page) {
        ChromeDriver browser = open(page);
        List<String> complaints = new ArrayList<>();
        for (LogEntry entry : browser.manage().logs().get(LogType.BROWSER)) {
            // The software renderer of the test machine says that reading pixels back is slow; that is no fault of a
            // page.
            if (entry.getLevel().intValue() >= Level.WARNING.intValue()
                    && !entry.getMessage().contains("GPU stall due to ReadPixels")) {
                complaints.add(entry.getMessage());
            }
        }
        assertThat(complaints).isEmpty();
        for (LogEntry entry : browser.manage().logs().get(LogType.PERFORMANCE)) {
            if (entry.getMessage().contains("\"Network.requestWillBeSent\"")) {
                Matcher m = REQUEST.matcher(entry.getMessage());
                while (m.find()) {
                    assertThat(m.group(1))
                            .satisfiesAnyOf(
                                    url -> assertThat(url).endsWith("/" + page),
                                    url -> assertThat(url).startsWith("data:"));
                }
            }
        }
        assertThat(browser.findElements(By.tagName("figure"))).hasSizeGreaterThanOrEqualTo(3);
    }

    @ParameterizedTest
    @ValueSource(ints = {1300, 360})
    void nothingSticksOutSideways(int width) {
        ChromeDriver browser = open("posture-cost.html");
        browser.manage().window().setSize(new Dimension(width, 900));
        Object over = browser.executeScript(
                "return document.documentElement.scrollWidth - document.documentElement.clientWidth");
        browser.manage().window().setSize(new Dimension(1300, 1000));
        assertThat(((Number) over).intValue()).as("pixels that stick out").isLessThanOrEqualTo(0);
    }

    @Test
    void drawingsHaveTheirNumbersOnRequest() {
        ChromeDriver browser = open("posture-cost.html");
        WebElement details = browser.findElement(By.cssSelector("figure details"));
        WebElement table = details.findElement(By.tagName("table"));
        assertThat(table.isDisplayed()).isFalse();
        details.findElement(By.tagName("summary")).sendKeys(Keys.ENTER);
        assertThat(table.isDisplayed()).isTrue();
    }

    private static byte[] pixels(ChromeDriver browser) {
        return browser.findElement(By.id("stage")).getScreenshotAs(OutputType.BYTES);
    }

    private static String state(ChromeDriver browser) {
        return browser.findElement(By.id("scene-state")).getText();
    }

    @Test
    void theFootIsDrawnAndRolls() throws InterruptedException {
        ChromeDriver browser = open("foot-model-right.html");
        assertThat(browser.findElement(By.id("scene")).isDisplayed()).isTrue();
        assertThat(browser.findElement(By.id("stills")).isDisplayed()).isFalse();
        byte[] first = pixels(browser);
        browser.findElement(By.id("play")).click();
        Thread.sleep(700);
        browser.findElement(By.id("play")).click();
        assertThat(Arrays.equals(pixels(browser), first))
                .as("the same picture after playing")
                .isFalse();
    }

    @Test
    void sliderAndKeysMoveTheFootAndTheView() {
        ChromeDriver browser = open("foot-model-right.html");
        WebElement slider = browser.findElement(By.id("instant"));
        String before = state(browser);
        slider.sendKeys(Keys.ARROW_RIGHT, Keys.ARROW_RIGHT, Keys.ARROW_RIGHT);
        assertThat(state(browser)).isNotEqualTo(before).contains("% of stance");
        WebElement stage = browser.findElement(By.id("stage"));
        byte[] seen = pixels(browser);
        stage.sendKeys(Keys.ARROW_LEFT, Keys.ARROW_LEFT);
        byte[] turned = pixels(browser);
        assertThat(Arrays.equals(turned, seen)).isFalse();
        stage.sendKeys("t");
        byte[] top = pixels(browser);
        assertThat(Arrays.equals(top, turned)).isFalse();
        stage.sendKeys("s");
        assertThat(Arrays.equals(pixels(browser), top)).isFalse();
        String here = state(browser);
        stage.sendKeys(".");
        assertThat(state(browser)).isNotEqualTo(here);
        stage.sendKeys("r");
        assertThat(state(browser)).startsWith("0 %");
    }
}
