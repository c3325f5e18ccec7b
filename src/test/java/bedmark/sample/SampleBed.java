package bedmark.sample;

import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;

/**
 * What really lies in a zone: the area that carries the feed at the pace of the bed, laid along the zone in a shape.
 *
 * @param positions of the stations (m)
 * @param areas     of the bed there (m²)
 */
record SampleBed(List<Double> positions, List<Double> areas) {
    /** Shapes as depth over mean depth, evenly spaced from the start of the zone to its end. */
    private enum Shape {
        LEVEL(1.03, 1.00, 1.00, 1.00, 1.00),
        SETTLING(1.22, 1.07, 1.00, 0.97, 0.97),
        BUILDING(0.72, 0.94, 1.10, 1.12, 1.08),
        SURGING(1.10, 0.84, 1.15, 1.15, 0.65);

        private final double[] factors;

        Shape(double... factors) {
            this.factors = factors;
        }

        double at(double share) {
            double place = share * (factors.length - 1);
            int before = Math.min((int) place, factors.length - 2);
            return factors[before] + (place - before) * (factors[before + 1] - factors[before]);
        }

        double mean(double length, List<Double> positions) {
            double last = positions.get(positions.size() - 1);
            double sum = at(positions.get(0) / length) * positions.get(0) + at(last / length) * (length - last);
            for (int i = 0; i + 1 < positions.size(); i++) {
                sum += (at(positions.get(i) / length) + at(positions.get(i + 1) / length)) / 2
                        * (positions.get(i + 1) - positions.get(i));
            }
            return sum / length;
        }
    }

    /**
     * Lays the bed.
     *
     * @param area  mean area (m²)
     * @param shape {@code level}, {@code settling}, {@code building} or {@code surging}
     * @param noise how far the depth strays from the shape (m)
     */
    static SampleBed of(SampleTrough trough, double length, List<Double> positions, double area, String shape,
            double noise, Random chance) {
        Shape along = Arrays.stream(Shape.values()).filter(one -> one.name().equalsIgnoreCase(shape)).findFirst()
                .orElseThrow(() -> new IllegalStateException("no shape " + shape));
        double mean = trough.level(area);
        double scale = mean / along.mean(length, positions);
        List<Double> areas = positions.stream().map(position -> mean < 0 ? area : trough.carried()
                + trough.spacing() * (scale * along.at(position / length) + noise * chance.nextGaussian())).toList();
        return new SampleBed(positions, areas);
    }

    /** ∫h² dx of the depths at the boards (m³). */
    double integralOfSquare(SampleTrough trough, double length) {
        double[] depths = areas.stream().mapToDouble(area -> Math.max(0, trough.level(area))).toArray();
        int last = depths.length - 1;
        double ends = depths[0] * depths[0] * positions.get(0)
                + depths[last] * depths[last] * (length - positions.get(last));
        return ends + IntStream.range(0, last).mapToDouble(i -> (positions.get(i + 1) - positions.get(i))
                * (depths[i] * depths[i] + depths[i] * depths[i + 1] + depths[i + 1] * depths[i + 1]) / 3).sum();
    }
}
