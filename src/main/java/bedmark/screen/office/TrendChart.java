package bedmark.screen.office;

import bedmark.office.trend.Change;
import bedmark.office.trend.Observation;
import bedmark.office.trend.Outlook;
import bedmark.office.trend.Series;
import bedmark.office.trend.TheilSen;
import java.time.Instant;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.DoubleFunction;
import java.util.stream.Stream;
import javafx.geometry.VPos;
import javafx.scene.Node;
import javafx.scene.layout.Pane;
import javafx.scene.shape.Circle;
import javafx.scene.shape.Line;
import javafx.scene.text.Text;

/**
 * One measure over time: values with bars of two standard uncertainties, limits as lines, what changed as upright
 * lines, and the trend where there is one.
 */
final class TrendChart extends Pane {
    private static final double DAY = 86_400_000.0;
    private static final double TICKS = 5;

    private final Series series;
    private final List<Change> changes;
    private final DoubleFunction<String> shown;
    private final double top;
    private final double from;
    private final double to;

    /** @param shown a value with its unit */
    TrendChart(Series series, List<Change> changes, DoubleFunction<String> shown) {
        this.series = series;
        this.changes = changes;
        this.shown = shown;
        getStyleClass().add("trend-chart");
        double most = Stream.concat(series.observations().stream().map(one -> one.value()
                + 2 * one.standardUncertainty()), Stream.of(series.near(), series.overloaded())
                .filter(OptionalDouble::isPresent).map(OptionalDouble::getAsDouble)).max(Double::compare).orElse(1.0);
        top = most > 0 ? most * 1.1 : 1;
        List<Instant> times = series.observations().stream().map(Observation::at).toList();
        double first = days(times.get(0));
        double last = days(times.get(times.size() - 1));
        double room = Math.max(30, last - first) * 0.06;
        from = first - room;
        to = Math.max(last + room, reached().map(day -> Math.min((double) day.toEpochDay(), last + 4 * room))
                .orElse(last + room));
    }

    private Optional<LocalDate> reached() {
        return series.outlook() instanceof Outlook.Trend trend
                ? trend.overloaded().map(Outlook.Reached::expected).flatMap(Outlook.When::day) : Optional.empty();
    }

    private static double days(Instant at) {
        return at.toEpochMilli() / DAY;
    }

    @Override
    protected void layoutChildren() {
        getChildren().clear();
        double left = Math.max(84, getWidth() * 0.09);
        double width = getWidth() - left - 12;
        double height = getHeight() - 34;
        if (width <= 0 || height <= 0) {
            return;
        }
        double step = step();
        for (double value = 0; value <= top; value += step) {
            double y = y(value, height);
            add("grid", new Line(left, y, left + width, y));
            Text text = text("axis", shown.apply(value), 0, y);
            text.setX(left - 8 - text.getLayoutBounds().getWidth());
        }
        for (Change change : changes) {
            double x = x(days(change.at()), left, width);
            add("change", new Line(x, 8, x, 8 + height));
        }
        series.near().ifPresent(limit -> limit("near", limit, left, width, height));
        series.overloaded().ifPresent(limit -> limit("over", limit, left, width, height));
        line(left, width, height);
        double before = Double.NEGATIVE_INFINITY;
        for (Observation one : series.observations()) {
            before = point(one, left, width, height, before);
        }
    }

    /** A round step that gives about five lines: 1, 2 or 5 times a power of ten. */
    private double step() {
        double rough = top / TICKS;
        double power = Math.pow(10, Math.floor(Math.log10(rough)));
        double digit = rough / power;
        return power * (digit <= 1 ? 1 : digit <= 2 ? 2 : digit <= 5 ? 5 : 10);
    }

    private double x(double day, double left, double width) {
        return left + (day - from) / (to - from) * width;
    }

    private double y(double value, double height) {
        return 8 + height * (1 - Math.max(0, Math.min(top, value)) / top);
    }

    private void limit(String styleClass, double limit, double left, double width, double height) {
        double y = y(limit, height);
        add("limit-" + styleClass, new Line(left, y, left + width, y));
    }

    private void line(double left, double width, double height) {
        Optional<TheilSen> fit = series.outlook() instanceof Outlook.Trend trend ? Optional.of(trend.line())
                : series.outlook() instanceof Outlook.Level level ? Optional.of(level.line()) : Optional.empty();
        fit.ifPresent(one -> {
            double begin = Math.max(from, days(series.begun()));
            add("fit", new Line(x(begin, left, width), y(one.intercept() + one.slope() * begin, height),
                    x(to, left, width), y(one.intercept() + one.slope() * to, height)));
        });
    }

    private double point(Observation one, double left, double width, double height, double before) {
        double x = x(days(one.at()), left, width);
        double bar = 2 * one.standardUncertainty();
        if (bar > 0) {
            add("bar", new Line(x, y(one.value() - bar, height), x, y(one.value() + bar, height)));
        }
        add(one.replaced() ? "replaced" : "point", new Circle(x, y(one.value(), height), 5));
        Text day = text("axis", one.at().atZone(ZoneOffset.UTC).toLocalDate().toString(), x, 8 + height + 15);
        double half = day.getLayoutBounds().getWidth() / 2;
        double begin = Math.max(left, Math.min(left + width - 2 * half, x - half));
        if (begin < before + 8) {
            getChildren().remove(day);
            return before;
        }
        day.setX(begin);
        return begin + 2 * half;
    }

    private Text text(String styleClass, String words, double x, double y) {
        Text text = new Text(x, y, words);
        text.setTextOrigin(VPos.CENTER);
        add(styleClass, text);
        text.applyCss();
        return text;
    }

    private void add(String styleClass, Node node) {
        node.getStyleClass().add(styleClass);
        node.setManaged(false);
        getChildren().add(node);
    }
}
