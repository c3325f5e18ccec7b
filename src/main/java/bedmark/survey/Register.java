package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.quantity.Quantity;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.IntStream;

/**
 * The plant's register: areas, materials, conveyors and transfer points, as typed views over the plant's document.
 */
public final class Register {
    private final Branch plant;
    private final Map<String, Material> materials;
    private final Map<String, Conveyor> conveyors;
    private final Map<String, Transfer> transfers;

    /**
     * @param plant the {@code plant} object of a bundle
     * @throws Refused where an id is absent or stands twice, or a transfer names a conveyor or material that is not
     *                 there; the place is a pointer within the plant
     */
    public Register(Branch plant) {
        this.plant = plant;
        this.materials = byId("materials", Material::new);
        this.conveyors = byId("conveyors", Conveyor::new);
        this.transfers = byId("transfers", Transfer::new);
        int index = 0;
        for (Transfer transfer : transfers.values()) {
            Pointer place = Pointer.of("transfers").child(index++);
            if (!conveyors.containsKey(transfer.conveyor())) {
                throw new Refused(Defect.at(place.child("conveyor"), "conveyor-unknown", transfer.conveyor()));
            }
            transfer.material().filter(id -> !materials.containsKey(id)).ifPresent(id -> {
                throw new Refused(Defect.at(place.child("material"), "material-unknown", id));
            });
        }
    }

    private <T> Map<String, T> byId(String key, Function<Branch, T> view) {
        Map<String, T> byId = new LinkedHashMap<>();
        List<Branch> items = plant.branches(key);
        for (int i = 0; i < items.size(); i++) {
            Pointer place = Pointer.of(key).child(i);
            String id = items.get(i).text("id")
                    .orElseThrow(() -> new Refused(Defect.at(place, "key-absent", "id")));
            if (byId.put(id, view.apply(items.get(i))) != null) {
                throw new Refused(Defect.at(place.child("id"), "id-twice", id));
            }
        }
        return byId;
    }

    /** The whole document. */
    public Branch document() {
        return plant;
    }

    /**
     * Where a thing stands in the document.
     *
     * @param list {@code materials}, {@code conveyors} or {@code transfers}
     */
    Optional<Pointer> place(String list, String id) {
        List<Branch> items = plant.branches(list);
        return IntStream.range(0, items.size()).filter(i -> items.get(i).text("id").equals(Optional.of(id)))
                .mapToObj(i -> Pointer.of(list).child(i)).findFirst();
    }

    public String name() {
        return plant.text("name").orElse("");
    }

    public List<Branch> areas() {
        return plant.branches("areas");
    }

    public Map<String, Material> materials() {
        return Collections.unmodifiableMap(materials);
    }

    public Map<String, Conveyor> conveyors() {
        return Collections.unmodifiableMap(conveyors);
    }

    /** The transfer points by id, in the register's order. */
    public Map<String, Transfer> transfers() {
        return Collections.unmodifiableMap(transfers);
    }

    public Optional<Transfer> transfer(String id) {
        return Optional.ofNullable(transfers.get(id));
    }

    /** The conveyor that a transfer point loads onto. */
    public Conveyor conveyorOf(Transfer transfer) {
        return conveyors.get(transfer.conveyor());
    }

    /** All loading zones of one conveyor, in the register's order. */
    public List<Transfer> zonesOf(String conveyor) {
        return transfers.values().stream().filter(transfer -> transfer.conveyor().equals(conveyor)).toList();
    }

    /** A bulk material. */
    public record Material(Branch document) {
        public String id() {
            return document.text("id").orElseThrow();
        }

        public String name() {
            return document.text("name").orElse(id());
        }
    }

    /** A belt conveyor. */
    public record Conveyor(Branch document) {
        public String id() {
            return document.text("id").orElseThrow();
        }

        public String tag() {
            return document.text("tag").orElse(id());
        }

        public Optional<Quantity> quantity(String key) {
            return document.quantity(key);
        }
    }

    /** A transfer point: one loading zone. */
    public record Transfer(Branch document) {
        public Transfer {
            if (!document.has("conveyor")) {
                throw new Refused(Defect.at(Pointer.ROOT, "key-absent", "conveyor"));
            }
        }

        public String id() {
            return document.text("id").orElseThrow();
        }

        public String tag() {
            return document.text("tag").orElse(id());
        }

        /** The id of the receiving conveyor. */
        public String conveyor() {
            return document.text("conveyor").orElseThrow();
        }

        /** The id of the material that the register expects here. */
        public Optional<String> material() {
            return document.text("material");
        }

        /** What feeds the zone, as the register words it. */
        public Optional<String> from() {
            return document.text("from");
        }

        /** The area's id. */
        public Optional<String> area() {
            return document.text("area");
        }

        public Optional<Quantity> quantity(String key) {
            return document.quantity(key);
        }
    }

    /** The names that {@link #areas()} holds, by id. */
    public Map<String, String> areaNames() {
        Map<String, String> names = new LinkedHashMap<>();
        for (Branch area : areas()) {
            area.text("id").ifPresent(id -> names.put(id, area.text("name").orElse(id)));
        }
        return names;
    }

    /** A register without anything in it. */
    public static Register empty() {
        return new Register(Branch.EMPTY.with("transfers", new Node.Series(List.of())));
    }
}
