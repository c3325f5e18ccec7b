package bedmark.engine;

import bedmark.engine.bed.Profile;
import bedmark.engine.bed.ProfileFormula;
import bedmark.engine.bed.Section;
import bedmark.engine.bed.Station;
import bedmark.engine.uncertainty.Uncertain;
import bedmark.engine.working.Formula;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** How each station's level came from its reading. */
final class StationWorking {
    private final ZoneFacts zone;
    private final WorkingSheet sheet;
    /** Written after all that they need, so that one formula stands together. */
    private final List<Runnable> levels = new ArrayList<>();

    StationWorking(ZoneFacts zone, WorkingSheet sheet) {
        this.zone = zone;
        this.sheet = sheet;
    }

    void write(Profile bed) {
        for (int i = 0; i < bed.stations(); i++) {
            Station station = zone.zone().stations().get(i);
            sheet.input("x" + (i + 1), Deduced.known(bed.position(i)), "m", station.position().name());
            station(i + 1, station, bed.level(i));
        }
        levels.forEach(Runnable::run);
    }

    private void station(int number, Station station, Uncertain level) {
        Map<String, String> signs = Map.of("h", "h" + number, "D", "D" + number, "f", "f" + number,
                "s′", "s′" + number);
        Uncertain raw = Uncertain.exact(station.raw().value());
        String name = station.raw().name();
        switch (station.method()) {
            case AT_BOARD, WEAR_LINE -> sheet.input("h" + number, Deduced.known(level), "m", name);
            case AT_CENTRE -> {
                sheet.input("D" + number, Deduced.known(zone.sources().take(station.raw())), "m", name);
                ofCentre(raw, level, signs);
            }
            case FROM_BOARD_TOP -> {
                sheet.input("f" + number, Deduced.known(zone.sources().take(station.raw())), "m", name);
                if (zone.height().get().value() >= station.raw().value()) {
                    level(ProfileFormula.OF_FREEBOARD, level, signs);
                } else {
                    underBoardLine(raw.minus(zone.height().get().certain()), level, signs);
                }
            }
        }
    }

    private void ofCentre(Uncertain depth, Uncertain level, Map<String, String> signs) {
        Section section = zone.section().get();
        troughDepth(section);
        if (!sheet.knows("r")) {
            sheet.step(Section.CROWN_RISE, section.crownRise(), "m");
        }
        Uncertain run = section.runOfCentreDepth(depth);
        if (depth.value() - section.troughDepth().value() - section.crownRise().value() >= 0) {
            level(Section.OF_CENTRE, level, signs);
        } else if (run.value() >= 0) {
            onWings(Section.RUN_OF_CENTRE, run, level, signs);
        } else {
            level(depth.value() > 0 ? Section.LEVEL_ON_CENTRE : Section.LEVEL_OF_NOTHING, level, signs);
        }
    }

    private void underBoardLine(Uncertain drop, Uncertain level, Map<String, String> signs) {
        Section section = zone.section().get();
        if (drop.value() < section.troughDepth().value()) {
            onWings(Section.RUN_OF_DROP, section.runUnderBoardLine(drop), level, signs);
            return;
        }
        troughDepth(section);
        boolean empty = section.riseUnderBoardLine(drop).value() <= 0;
        level(empty ? Section.LEVEL_OF_NOTHING : Section.LEVEL_ON_CENTRE_OF_DROP, level, signs);
    }

    private void troughDepth(Section section) {
        if (sheet.knows("d")) {
            return;
        }
        if (zone.isFlat()) {
            sheet.constant("d", 0, "m");
        } else {
            sheet.step(Section.TROUGH_DEPTH, section.troughDepth(), "m");
        }
    }

    private void onWings(Formula runFormula, Uncertain run, Uncertain level, Map<String, String> signs) {
        sheet.step(runFormula.withSigns(signs), run, "m");
        level(Section.LEVEL_ON_WINGS, level, signs);
    }

    private void level(Formula formula, Uncertain level, Map<String, String> signs) {
        levels.add(() -> sheet.step(formula.withSigns(signs), level, "m"));
    }
}
