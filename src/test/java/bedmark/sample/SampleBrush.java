package bedmark.sample;

import java.awt.BasicStroke;
import java.awt.Color;
import java.awt.GradientPaint;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.awt.image.BufferedImage;
import java.util.Random;

/** Draws the stuff of a loading zone: steel, rubber, stones, dust; always the same for the same seed. */
final class SampleBrush {
    private final BufferedImage image;
    private final Graphics2D graphics;
    private final Random chance;

    SampleBrush(int width, int height, long seed) {
        image = new BufferedImage(width, height, BufferedImage.TYPE_INT_RGB);
        graphics = image.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
        graphics.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
        chance = new Random(seed);
    }

    /** Fills a shape from one colour at its top to another at its bottom. */
    void shade(Shape shape, Color top, Color bottom) {
        Rectangle2D box = shape.getBounds2D();
        graphics.setPaint(new GradientPaint(0, (float) box.getMinY(), top, 0, (float) box.getMaxY(), bottom));
        graphics.fill(shape);
    }

    /** Draws short strokes along a shape's width, lighter and darker than what is there. */
    void streaks(Shape shape, int count, double longest, int strength) {
        Rectangle2D box = shape.getBounds2D();
        graphics.setClip(shape);
        for (int i = 0; i < count; i++) {
            int tone = chance.nextBoolean() ? 255 : 0;
            graphics.setColor(new Color(tone, tone, tone, chance.nextInt(strength)));
            graphics.setStroke(new BasicStroke(0.6f + 1.6f * chance.nextFloat()));
            double x = box.getX() + chance.nextDouble() * box.getWidth();
            double y = box.getY() + chance.nextDouble() * box.getHeight();
            Path2D stroke = new Path2D.Double();
            stroke.moveTo(x, y);
            stroke.lineTo(x + longest * chance.nextDouble(), y + 2 * chance.nextGaussian());
            graphics.draw(stroke);
        }
        graphics.setClip(null);
    }

    /** Lays soft blotches of a colour over a shape: rust, dust, cake. */
    void blotches(Shape shape, int count, double size, Color colour, int strength) {
        Rectangle2D box = shape.getBounds2D();
        graphics.setClip(shape);
        for (int i = 0; i < count; i++) {
            double x = box.getX() + chance.nextDouble() * box.getWidth();
            double y = box.getY() + chance.nextDouble() * box.getHeight();
            double radius = size * (0.3 + chance.nextDouble());
            for (double share = 1; share > 0.2; share -= 0.2) {
                graphics.setColor(new Color(colour.getRed(), colour.getGreen(), colour.getBlue(), strength));
                graphics.fill(lump(x, y, radius * share, 0.35));
            }
        }
        graphics.setClip(null);
    }

    /** Heaps stones in a shape, the far ones first. */
    void stones(Shape shape, int rows, double size, Color colour) {
        Rectangle2D box = shape.getBounds2D();
        graphics.setClip(shape);
        for (int row = 0; row < rows; row++) {
            double depth = row / (double) rows;
            double across = size * (0.55 + 0.75 * depth);
            double y = box.getY() + box.getHeight() * depth;
            double x = box.getX() - size;
            while (x < box.getMaxX() + size) {
                stone(x, y + across * chance.nextGaussian() / 3, across * (0.35 + 0.35 * chance.nextDouble()), colour);
                x += across * (0.7 + 0.9 * chance.nextDouble());
            }
        }
        graphics.setClip(null);
    }

    private void stone(double x, double y, double radius, Color colour) {
        double light = 0.75 + 0.4 * chance.nextDouble();
        long form = chance.nextLong();
        graphics.setColor(new Color(0, 0, 0, 90));
        graphics.fill(lump(x + radius * 0.18, y + radius * 0.25, radius * 1.05, 0.3, new Random(form)));
        Shape body = lump(x, y, radius, 0.3, new Random(form));
        shade(body, toned(colour, light * 1.15), toned(colour, light * 0.6));
        graphics.setColor(new Color(255, 255, 255, 38));
        graphics.fill(lump(x - radius * 0.2, y - radius * 0.3, radius * 0.5, 0.4, new Random(form)));
    }

    /** A row of bolts with washers. */
    void bolts(double x, double y, double step, int count, double size) {
        for (int i = 0; i < count; i++) {
            Shape washer = new Ellipse2D.Double(x + i * step - size, y - size, 2 * size, 2 * size);
            graphics.setColor(new Color(0, 0, 0, 80));
            graphics.fill(new Ellipse2D.Double(x + i * step - size + 2, y - size + 4, 2 * size, 2 * size));
            shade(washer, new Color(0xA9A59B), new Color(0x5E5A53));
            Path2D head = new Path2D.Double();
            for (int corner = 0; corner < 6; corner++) {
                double angle = Math.PI / 3 * corner + 0.35 * i;
                double cx = x + i * step + size * 0.62 * Math.cos(angle);
                double cy = y + size * 0.62 * Math.sin(angle);
                if (corner == 0) {
                    head.moveTo(cx, cy);
                } else {
                    head.lineTo(cx, cy);
                }
            }
            head.closePath();
            shade(head, new Color(0x8B8478), new Color(0x3F3B36));
        }
    }

    private Shape lump(double x, double y, double radius, double roughness) {
        return lump(x, y, radius, roughness, chance);
    }

    private static Shape lump(double x, double y, double radius, double roughness, Random form) {
        Path2D outline = new Path2D.Double();
        int corners = 7 + form.nextInt(4);
        for (int i = 0; i < corners; i++) {
            double angle = 2 * Math.PI * i / corners;
            double reach = radius * (1 + roughness * (form.nextDouble() - 0.5) * 2);
            double px = x + reach * Math.cos(angle);
            double py = y + 0.8 * reach * Math.sin(angle);
            if (i == 0) {
                outline.moveTo(px, py);
            } else {
                outline.lineTo(px, py);
            }
        }
        outline.closePath();
        return outline;
    }

    private static Color toned(Color colour, double light) {
        return new Color(tone(colour.getRed() * light), tone(colour.getGreen() * light),
                tone(colour.getBlue() * light));
    }

    private static int tone(double value) {
        return (int) Math.max(0, Math.min(255, Math.round(value)));
    }

    /** The picture with a lamp's fall-off and, where there is any, the grain of a small sensor. */
    BufferedImage finish(double grain) {
        graphics.dispose();
        double cx = image.getWidth() * 0.48;
        double cy = image.getHeight() * 0.44;
        double reach = Math.hypot(cx, cy);
        for (int y = 0; y < image.getHeight(); y++) {
            for (int x = 0; x < image.getWidth(); x++) {
                double away = Math.hypot(x - cx, y - cy) / reach;
                double light = 1.28 - 0.5 * away * away;
                double noise = grain == 0 ? 0 : grain * chance.nextGaussian();
                int rgb = image.getRGB(x, y);
                image.setRGB(x, y, tone((rgb >> 16 & 255) * light + noise) << 16
                        | tone((rgb >> 8 & 255) * light + noise) << 8 | tone((rgb & 255) * light + noise));
            }
        }
        return image;
    }
}
