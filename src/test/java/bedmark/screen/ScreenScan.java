package bedmark.screen;

import bedmark.screen.part.FieldBox;
import bedmark.screen.theme.Density;
import bedmark.screen.theme.Hand;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javafx.geometry.Bounds;
import javafx.scene.Node;
import javafx.scene.Parent;
import javafx.scene.Scene;
import javafx.scene.control.ButtonBase;
import javafx.scene.control.ContentDisplay;
import javafx.scene.control.Control;
import javafx.scene.control.Label;
import javafx.scene.control.Labeled;
import javafx.scene.control.ListView;
import javafx.scene.control.ScrollPane;
import javafx.scene.control.TextInputControl;
import javafx.scene.layout.BackgroundFill;
import javafx.scene.layout.Region;
import javafx.scene.paint.Color;
import javafx.scene.text.Text;

/** Looks through everything that a scene shows, for what a hand cannot hit, an eye cannot read or an ear not hear. */
final class ScreenScan {
    private static final double SLACK = 1;

    private final double width;
    private final double height;
    private final double foot;
    private final Density bare;
    private final Density density;
    private final List<String> findings = new ArrayList<>();

    private ScreenScan(Parent root, Density density, double width, double height) {
        this.width = width;
        this.height = height;
        this.foot = Optional.ofNullable(root.lookup(".foot-bar")).map(bar -> top(bar)).orElse(height);
        this.density = density;
        this.bare = new Density(density.dpi(), Hand.BARE);
    }

    /** What is wrong with a scene, in words; called on the screen's thread. */
    static List<String> of(Scene scene, Density density) {
        return of(scene.getRoot(), density, scene.getWidth(), scene.getHeight());
    }

    /** The same as if the glass had so many pixels, which is how it is on a denser one of the same size. */
    static List<String> of(Parent root, Density density, double width, double height) {
        root.resize(width, height);
        for (int pass = 0; pass < 2; pass++) {
            root.applyCss();
            root.layout();
        }
        ScreenScan scan = new ScreenScan(root, density, width, height);
        scan.look(root);
        return scan.findings;
    }

    private static double top(Node node) {
        return node.localToScene(node.getLayoutBounds()).getMinY();
    }

    /** Whether the caution stands on the screen. */
    static boolean hasCaution(Scene scene) {
        return scene.getRoot().lookupAll(".caution").stream().anyMatch(node -> shown(node)
                && node.getLayoutBounds().getHeight() > 0 && node.lookupAll(".words").stream()
                .anyMatch(words -> !((Label) words).getText().isBlank()));
    }

    private static boolean shown(Node node) {
        return node.isVisible() && (node.getParent() == null || shown(node.getParent()));
    }

    private void look(Node node) {
        if (!node.isVisible()) {
            return;
        }
        target(node);
        focus(node);
        inSight(node);
        if (node instanceof TextInputControl input) {
            contrast(input);
        }
        if (node instanceof Labeled labeled) {
            whole(labeled);
            contrast(labeled);
        }
        if (node instanceof Parent parent) {
            apart(parent);
            parent.getChildrenUnmodifiable().forEach(this::look);
        }
    }

    private void target(Node node) {
        if (!(node instanceof ButtonBase || node instanceof FieldBox || node instanceof TextInputControl)
                || node.getStyleClass().contains("arrow-button")) {
            return;
        }
        double least = node.getStyleClass().contains("secondary-target") ? bare.secondary()
                : node.getStyleClass().contains("pad-key") ? density.target() : bare.target();
        double height = node.getLayoutBounds().getHeight();
        if (height < least - 0.01) {
            findings.add("too low: " + name(node) + " has " + height + " px of " + least);
        }
    }

    private void focus(Node node) {
        if (node.isFocusTraversable() && !node.isDisabled() && node.getAccessibleText() == null
                && !(node instanceof Labeled labeled && labeled.getText() != null && !labeled.getText().isBlank())) {
            findings.add("no name: " + name(node));
        }
    }

    private void whole(Labeled labeled) {
        if (labeled.getText() == null || labeled.getText().isEmpty()
                || labeled.getContentDisplay() == ContentDisplay.GRAPHIC_ONLY) {
            return;
        }
        if (!(labeled.lookup(".text") instanceof Text text)) {
            return;
        }
        if (!bare(text.getText()).equals(bare(labeled.getText()))) {
            findings.add("cut: " + labeled.getText() + " is shown as " + text.getText());
        }
        Bounds inner = text.localToScene(text.getLayoutBounds());
        Bounds outer = labeled.localToScene(labeled.getLayoutBounds());
        if (inner.getMinX() < outer.getMinX() - SLACK || inner.getMaxX() > outer.getMaxX() + SLACK
                || inner.getMinY() < outer.getMinY() - 3 * SLACK || inner.getMaxY() > outer.getMaxY() + 3 * SLACK) {
            findings.add("cut: " + labeled.getText() + " leaves its box");
        }
    }

    /** What cannot be scrolled into sight is in sight as a whole: on the glass, and not under the foot. */
    private void inSight(Node node) {
        if (!(node instanceof Control || node instanceof FieldBox) || node instanceof ScrollPane) {
            return;
        }
        Bounds bounds = node.localToScene(node.getLayoutBounds());
        boolean aside = bounds.getMinX() < -SLACK || bounds.getMaxX() > width + SLACK;
        boolean below = !within(node, ScrollPane.class) && !within(node, ListView.class) && !inFoot(node)
                && (bounds.getMinY() < -SLACK || bounds.getMaxY() > Math.min(foot, height) + SLACK);
        if (aside || below) {
            findings.add("out of sight: " + name(node) + " at " + bounds);
        }
    }

    private static boolean within(Node node, Class<? extends Node> kind) {
        return node.getParent() != null && (kind.isInstance(node.getParent()) || within(node.getParent(), kind));
    }

    private static boolean inFoot(Node node) {
        return node.getStyleClass().contains("foot-bar") || node.getParent() != null && inFoot(node.getParent());
    }

    private void contrast(TextInputControl input) {
        input.lookupAll(".text").stream().filter(Text.class::isInstance).map(Text.class::cast)
                .filter(text -> text.getFill() instanceof Color && !text.getText().isBlank())
                .forEach(text -> ground(input).filter(ground -> contrast((Color) text.getFill(), ground) < 7)
                        .ifPresent(ground -> findings.add("too faint: " + name(input) + " " + text.getFill() + " on "
                                + ground)));
    }

    /** Text stands out from what it stands on by 7 to 1; a control that does nothing now may be fainter. */
    private void contrast(Labeled labeled) {
        if (labeled.getText() == null || labeled.getText().isBlank() || labeled.isDisabled()
                || !(labeled.getTextFill() instanceof Color ink)) {
            return;
        }
        ground(labeled).filter(ground -> contrast(ink, ground) < 7).ifPresent(ground ->
                findings.add("too faint: " + name(labeled) + " " + ink + " on " + ground));
    }

    private static Optional<Color> ground(Node node) {
        for (Node at = node; at != null; at = at.getParent()) {
            if (at instanceof Region region && region.getBackground() != null
                    && !region.getBackground().getFills().isEmpty()) {
                List<BackgroundFill> fills = region.getBackground().getFills();
                if (fills.get(fills.size() - 1).getFill() instanceof Color colour && colour.isOpaque()) {
                    return Optional.of(colour);
                }
            }
        }
        return Optional.empty();
    }

    private static double contrast(Color one, Color other) {
        double lighter = Math.max(luminance(one), luminance(other));
        double darker = Math.min(luminance(one), luminance(other));
        return (lighter + 0.05) / (darker + 0.05);
    }

    private static double luminance(Color colour) {
        return 0.2126 * linear(colour.getRed()) + 0.7152 * linear(colour.getGreen())
                + 0.0722 * linear(colour.getBlue());
    }

    private static double linear(double share) {
        return share <= 0.03928 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
    }

    private static String bare(String text) {
        return text.replaceAll("\\s", "");
    }

    /** Texts of one parent do not lie over each other. */
    private void apart(Parent parent) {
        List<Node> texts = parent.getChildrenUnmodifiable().stream().filter(node -> node.isVisible()
                && (node instanceof Label label && !label.getText().isEmpty() || node instanceof ButtonBase
                || node instanceof FieldBox)).toList();
        for (int i = 0; i < texts.size(); i++) {
            for (int j = i + 1; j < texts.size(); j++) {
                if (overlap(texts.get(i).getBoundsInParent(), texts.get(j).getBoundsInParent())) {
                    findings.add("over each other: " + name(texts.get(i)) + " and " + name(texts.get(j)));
                }
            }
        }
    }

    private static boolean overlap(Bounds one, Bounds other) {
        return one.getMinX() + SLACK < other.getMaxX() && other.getMinX() + SLACK < one.getMaxX()
                && one.getMinY() + SLACK < other.getMaxY() && other.getMinY() + SLACK < one.getMaxY();
    }

    private static String name(Node node) {
        String text = node instanceof Labeled labeled ? labeled.getText() : node.getAccessibleText();
        return node.getClass().getSimpleName() + Optional.ofNullable(node.getId()).map(id -> " #" + id).orElse("")
                + " " + node.getStyleClass() + " " + (node instanceof Control || text != null ? text : "");
    }
}
