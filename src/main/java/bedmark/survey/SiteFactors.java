package bedmark.survey;

import static bedmark.document.Refused.below;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.engine.bed.DepthMethod;
import bedmark.engine.fit.DrivePair;
import bedmark.engine.fit.DriveState;
import bedmark.engine.fit.SiteFit;
import bedmark.engine.uncertainty.Instrument;
import bedmark.engine.uncertainty.Instruments;
import bedmark.engine.uncertainty.Reading;
import bedmark.quantity.Dimension;
import bedmark.quantity.Quantity;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The factors that a site fitted from readings of its own drives: {@code siteFactors} of the plant. A row with pairs is
 * fitted anew from them; one without takes the factor that it names, with its uncertainty.
 *
 * @param rows in the register's order
 */
public record SiteFactors(List<Row> rows) {
    private static final Pointer ROWS = Pointer.of("siteFactors");

    /**
     * One row.
     *
     * @param material  the id of the material it holds for; for every one where absent
     * @param conveyor  the id of the conveyor it holds for; for every one where absent
     * @param factor    lbf/(ft·in²); absent where the pairs cannot carry it, or where only seals were lifted
     * @param sealRate  N/m, where seals were lifted
     * @param fittedAt  when the readings were taken
     * @param pairs     how many pairs of readings are behind it, where they are known
     * @param unfit     why the pairs cannot carry it
     */
    public record Row(Optional<String> material, Optional<String> conveyor, Optional<Reading> factor,
            Optional<Reading> sealRate, OffsetDateTime fittedAt, int pairs, Optional<SiteFit.Unfit> unfit) {
    }

    public SiteFactors {
        rows = List.copyOf(rows);
    }

    /**
     * The factors of a register.
     *
     * @throws Refused where a row lacks what it needs; the place is a pointer within the plant
     * @throws bedmark.engine.uncertainty.ImpossibleReading where a reading of a pair cannot be
     */
    static SiteFactors of(Register register, Instruments instruments) {
        List<Branch> documents = register.document().branches("siteFactors");
        List<Row> rows = new ArrayList<>();
        for (int i = 0; i < documents.size(); i++) {
            Branch row = documents.get(i);
            Reader reader = new Reader(register, new Taking(instruments), ROWS.child(i));
            rows.add(below(ROWS.child(i), () -> reader.row(row)));
        }
        return new SiteFactors(rows);
    }

    /** The row that holds for a survey: one that names its material before one that names its conveyor alone. */
    Optional<Row> of(Survey survey, Register register) {
        Optional<Register.Transfer> transfer = register.transfer(survey.transfer());
        Optional<String> conveyor = transfer.map(Register.Transfer::conveyor);
        Optional<String> material = transfer.flatMap(point -> ZoneMapping.material(survey, point, register))
                .map(Register.Material::id);
        Optional<Row> best = Optional.empty();
        int most = -1;
        for (Row row : rows) {
            boolean holds = (row.material().isEmpty() || row.material().equals(material))
                    && (row.conveyor().isEmpty() || row.conveyor().equals(conveyor));
            int named = (row.material().isPresent() ? 2 : 0) + (row.conveyor().isPresent() ? 1 : 0);
            if (holds && named > most) {
                best = Optional.of(row);
                most = named;
            }
        }
        return best;
    }

    /** Reads one row; places are pointers within it. */
    private record Reader(Register register, Taking taking, Pointer place) {

        Row row(Branch row) {
            OffsetDateTime fittedAt = row.time("fittedAt").orElseThrow(() -> absent(Pointer.ROOT, "fittedAt"));
            List<Branch> pairs = row.branches("pairs");
            Optional<String> material = row.text("material");
            Optional<String> conveyor = row.text("conveyor");
            if (pairs.isEmpty()) {
                double factor = number(row, "factor");
                Reading fitted = new Reading(name("factor"), factor, number(row, "standardUncertainty"));
                Optional<Reading> seals = row.quantity("sealRate").map(rate -> taking.reading(name("sealRate"), rate,
                        Dimension.LINE_FORCE, Instrument.SEAL_RATE));
                return new Row(material, conveyor, Optional.of(fitted), seals, fittedAt, 0, Optional.empty());
            }
            SiteFit fit = SiteFit.of(pairs(pairs, conveyor));
            if (fit instanceof SiteFit.Fitted fitted) {
                return new Row(material, conveyor,
                        fitted.factor().map(found -> new Reading(name("factor"), found.value(),
                                found.standardUncertainty())),
                        fitted.sealRate().map(found -> new Reading(name("sealRate"), found.value(),
                                found.standardUncertainty())), fittedAt, fitted.pairs(), Optional.empty());
            }
            return new Row(material, conveyor, Optional.empty(), Optional.empty(), fittedAt, pairs.size(),
                    Optional.of((SiteFit.Unfit) fit));
        }

        private List<DrivePair> pairs(List<Branch> documents, Optional<String> conveyor) {
            List<DrivePair> pairs = new ArrayList<>();
            for (int i = 0; i < documents.size(); i++) {
                Branch pair = documents.get(i);
                Pointer here = Pointer.of("pairs").child(i);
                pairs.add(below(here, () -> pair(pair, here, conveyor)));
            }
            return pairs;
        }

        private DrivePair pair(Branch pair, Pointer here, Optional<String> conveyor) {
            String id = pair.text("conveyor").or(() -> conveyor).orElseThrow(() -> absent(Pointer.ROOT, "conveyor"));
            Register.Conveyor drive = Optional.ofNullable(register.conveyors().get(id)).orElseThrow(() ->
                    new Refused(Defect.at(Pointer.of("conveyor"), "conveyor-unknown", id)));
            return new DrivePair(
                    reading(pair, here, "loadingZoneLength", Dimension.LENGTH, Instrument.TAPE),
                    reading(pair, here, "beltSpeed", Dimension.SPEED, Instrument.TACHOMETER),
                    efficiency(drive, "driveEfficiency"), efficiency(drive, "motorEfficiency"),
                    state(pair, here, "first"), state(pair, here, "second"));
        }

        private Reading efficiency(Register.Conveyor drive, String key) {
            BigDecimal value = drive.document().number(key).orElseThrow(() -> absent(Pointer.of("conveyor"), key));
            return taking.plain("/conveyor/" + key, value.doubleValue(), Instrument.EFFICIENCY);
        }

        private DriveState state(Branch pair, Pointer here, String key) {
            Branch state = pair.branch(key).orElseThrow(() -> absent(Pointer.ROOT, key));
            Pointer inside = here.child(key);
            return below(Pointer.of(key), () -> new DriveState(
                    reading(state, inside, "runningPower", Dimension.POWER, Instrument.POWER_METER),
                    state.quantity("bedDepth").map(depth -> taking.reading(name(inside, "bedDepth"), depth,
                            Dimension.LENGTH, Taking.depth(depth, DepthMethod.AT_BOARD))),
                    state.quantity("sealLength").map(length -> taking.reading(name(inside, "sealLength"), length,
                            Dimension.LENGTH, Instrument.TAPE)),
                    state.quantity("throughput").map(flow -> taking.reading(name(inside, "throughput"), flow,
                            Dimension.MASS_FLOW, Instrument.BELT_SCALE))));
        }

        private Reading reading(Branch holder, Pointer here, String key, Dimension dimension, Instrument instrument) {
            Quantity quantity = holder.quantity(key).orElseThrow(() -> absent(Pointer.ROOT, key));
            return taking.reading(name(here, key), quantity, dimension, instrument);
        }

        private String name(String key) {
            return "/plant" + place.child(key);
        }

        private String name(Pointer inside, String key) {
            return "/plant" + place + inside.child(key);
        }

        private static double number(Branch row, String key) {
            return row.number(key).orElseThrow(() -> absent(Pointer.ROOT, key)).doubleValue();
        }

        private static Refused absent(Pointer where, String key) {
            return new Refused(Defect.at(where, "key-absent", key));
        }
    }
}
