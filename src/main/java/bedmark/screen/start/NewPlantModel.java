package bedmark.screen.start;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Refused;
import bedmark.journal.NotSaved;
import bedmark.json.FormReader;
import bedmark.json.JsonReader;
import bedmark.json.ReferenceData;
import bedmark.quantity.Dimension;
import bedmark.quantity.NumberEntry;
import bedmark.quantity.Quantity;
import bedmark.quantity.TypedNumber;
import bedmark.quantity.Unit;
import bedmark.screen.Workplace;
import bedmark.survey.Act;
import bedmark.survey.FirstPlant;
import bedmark.wording.Wording;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.UUID;
import javafx.beans.property.ReadOnlyObjectProperty;
import javafx.beans.property.ReadOnlyObjectWrapper;
import javafx.beans.property.SimpleStringProperty;
import javafx.beans.property.StringProperty;

/** What is said of a new plant, until it is enough for a first transfer point to be judged. */
public final class NewPlantModel {
    private static final String OWN_MATERIAL = "material-1";

    private final Workplace workplace;
    private final Path form;
    private final Map<Text, StringProperty> texts = new EnumMap<>(Text.class);
    private final Map<Size, String> typed = new EnumMap<>(Size.class);
    private final Map<Size, Quantity> held = new EnumMap<>(Size.class);
    private final ReadOnlyObjectWrapper<Optional<Defect>> trouble = new ReadOnlyObjectWrapper<>(Optional.empty());
    private Optional<String> material = Optional.empty();
    private boolean own;

    /** What is said in words. */
    public enum Text { PLANT, BELT, TAG, FROM, MATERIAL }

    /** What is said in numbers. */
    public enum Size {
        WIDTH, TROUGH, CENTRE_ROLL, DENSITY, SURCHARGE;

        private boolean angle() {
            return this == TROUGH || this == SURCHARGE;
        }
    }

    private NewPlantModel(Workplace workplace, Path form) {
        this.workplace = workplace;
        this.form = form;
        for (Text text : Text.values()) {
            texts.put(text, new SimpleStringProperty(""));
        }
    }

    /** A new plant; nothing where the form to ask with does not lie beside the program. */
    public static Optional<NewPlantModel> of(Workplace workplace) {
        return form(workplace).map(form -> new NewPlantModel(workplace, form));
    }

    private static Optional<Path> form(Workplace workplace) {
        return workplace.samples().map(samples -> samples.toAbsolutePath().resolveSibling("field-forms")
                .resolve("loading-zone.json")).filter(Files::isRegularFile);
    }

    /** Whether a new plant can be made here. */
    public static boolean offered(Workplace workplace) {
        return form(workplace).isPresent();
    }

    public StringProperty text(Text text) {
        return texts.get(text);
    }

    /** Why it was not made. */
    public ReadOnlyObjectProperty<Optional<Defect>> troubleProperty() {
        return trouble.getReadOnlyProperty();
    }

    /** The materials that the reference table knows, in the person's language. */
    public List<Branch> materials() {
        return ReferenceData.shipped().materials(workplace.wording().words().language());
    }

    /** The row of the reference table that was chosen. */
    public Optional<String> material() {
        return material;
    }

    /** Whether the material is none of the table's. */
    public boolean ownMaterial() {
        return own;
    }

    /** Takes density and surcharge angle of the table; both can be typed over. */
    public void choose(Branch row) {
        own = false;
        material = row.text("id");
        typed.keySet().removeAll(List.of(Size.DENSITY, Size.SURCHARGE));
        row.quantity("bulkDensity").ifPresent(density -> held.put(Size.DENSITY, density));
        row.quantity("surchargeAngle").ifPresent(angle -> held.put(Size.SURCHARGE, angle));
    }

    /** The material is named and described by the person. */
    public void chooseOwn() {
        own = true;
        if (material.isPresent()) {
            material = Optional.empty();
            List.of(Size.DENSITY, Size.SURCHARGE).forEach(size -> {
                typed.remove(size);
                held.remove(size);
            });
        }
    }

    public Unit unit(Size size) {
        Wording wording = workplace.wording();
        return Optional.ofNullable(held.get(size)).map(Quantity::unit).orElseGet(() -> size.angle() ? Unit.DEGREE
                : size == Size.DENSITY ? wording.unit(Dimension.DENSITY) : wording.smallLength());
    }

    /** What stands in the box. */
    public String shown(Size size) {
        return typed.getOrDefault(size, Optional.ofNullable(held.get(size))
                .map(workplace.wording().format()::entered).orElse(""));
    }

    /** Something was typed; it counts as far as it is a number that can be. */
    public void type(Size size, String text) {
        Unit unit = unit(size);
        typed.put(size, text);
        held.remove(size);
        if (new NumberEntry(workplace.wording().words().locale()).read(text, unit)
                instanceof TypedNumber.Accepted accepted && possible(size, accepted.in(unit))) {
            held.put(size, accepted.in(unit));
        }
    }

    private static boolean possible(Size size, Quantity quantity) {
        return size.angle() ? quantity.si() >= 0 && quantity.si() < Math.PI / 2 : quantity.si() > 0;
    }

    /** Whether what stands in the box is a number that can be; an empty box is not wrong. */
    public boolean fits(Size size) {
        return shown(size).isBlank() || held.containsKey(size);
    }

    /** A flat belt has no centre roll. */
    public boolean asked(Size size) {
        return size != Size.CENTRE_ROLL || held.get(Size.TROUGH) == null || held.get(Size.TROUGH).si() != 0;
    }

    /** The texts that are still to be written. */
    public List<Text> textGaps() {
        List<Text> gaps = new ArrayList<>();
        for (Text text : Text.values()) {
            boolean asked = text != Text.FROM && (text != Text.MATERIAL || own);
            if (asked && said(text).isEmpty()) {
                gaps.add(text);
            }
        }
        return gaps;
    }

    /** The numbers that are still to be typed. */
    public List<Size> sizeGaps() {
        return List.of(Size.values()).stream().filter(this::asked).filter(size -> !held.containsKey(size)).toList();
    }

    /** Whether it is said what runs there. */
    public boolean materialSaid() {
        return own || material.isPresent();
    }

    private String said(Text text) {
        return texts.get(text).get().strip();
    }

    /** Makes the plant; whoever shows it hears of the plant by the workplace. */
    public void make() {
        Act act;
        try {
            act = plant().act(UUID.randomUUID(), workplace.wording().text("first.round"), readForm());
        } catch (Refused e) {
            trouble.set(Optional.of(e.defect()));
            return;
        }
        trouble.set(Optional.empty());
        workplace.longWork().execute(() -> {
            try {
                workplace.adopt(act);
            } catch (NotSaved e) {
                workplace.screen().execute(() -> trouble.set(Optional.of(e.defect())));
            }
        });
    }

    private FirstPlant plant() {
        return new FirstPlant(said(Text.PLANT), said(Text.BELT), held.get(Size.WIDTH), held.get(Size.TROUGH),
                Optional.ofNullable(held.get(Size.CENTRE_ROLL)), said(Text.TAG), said(Text.FROM), described());
    }

    private Branch described() {
        Branch row = material.flatMap(id -> materials().stream().filter(one -> one.text("id").equals(Optional.of(id)))
                .findFirst()).orElseGet(() -> Branch.EMPTY.with("id", OWN_MATERIAL).with("name", said(Text.MATERIAL)));
        return row.with("bulkDensity", held.get(Size.DENSITY)).with("surchargeAngle", held.get(Size.SURCHARGE));
    }

    private Branch readForm() {
        try {
            Branch read = JsonReader.read(Files.readAllBytes(form)).root();
            FormReader.read(read);
            return read;
        } catch (IOException e) {
            throw new Refused(Defect.in(form.toString(), "file-unreadable"), e);
        }
    }
}
