package nearworld.app.forms;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import nearworld.engine.basics.Fault;
import tools.jackson.databind.node.ArrayNode;
import tools.jackson.databind.node.JsonNodeFactory;
import tools.jackson.databind.node.ObjectNode;

/**
 * One attempt at a case in the exchange format. It remembers which field of which form each value came from, so that a
 * fault at a JSON path can be shown at its field.
 */
final class CaseDraft {
    private final Set<String> leftOut;
    private final ObjectNode json = JsonNodeFactory.instance.objectNode();
    private final Map<String, Place> places = new LinkedHashMap<>();
    private final List<RowFault> faults = new ArrayList<>();
    private boolean personUntouched;
    private boolean personIncomplete;
    private boolean assessedOnTyped;

    private CaseDraft(Set<String> leftOut) {
        this.leftOut = leftOut;
    }

    /** Where a value came from; {@code removable}: the row can be left out. */
    record Place(Section section, String row, String field, boolean removable) {
        FieldFault fault(Fault fault) {
            return new FieldFault(section, field, fault);
        }

        Place at(String otherField) {
            return new Place(section, row, otherField, removable);
        }
    }

    /** A fault that the form itself shows, before the exchange format is asked. */
    record RowFault(String row, FieldFault fault) {}

    static CaseDraft of(String caseRef, LocalDate today, CaseForms forms, Set<String> leftOut) {
        CaseDraft draft = new CaseDraft(leftOut);
        draft.json.put("format", "case/1");
        draft.json.put("caseRef", caseRef);
        draft.person(forms.person(), today);
        StatementsDraft.write(draft, forms.statements());
        HistoryDraft.write(draft, forms.history());
        CoverDraft.write(draft, forms.cover());
        WhatIfsDraft.write(draft, forms.whatIfs());
        return draft;
    }

    ObjectNode json() {
        return json;
    }

    List<RowFault> faults() {
        return faults;
    }

    boolean personIncomplete() {
        return personIncomplete;
    }

    /** True for a place in a person section that nobody has touched: no faults are shown there. */
    boolean isUntouchedPerson(Place place) {
        return personUntouched && place.section() == Section.PERSON;
    }

    /** The field that the value at a JSON path, or the nearest value around it, came from. */
    Optional<Place> place(String path) {
        String here = path;
        while (!here.isEmpty()) {
            Place place = places.get(here);
            if (place != null) {
                return Optional.of(place);
            }
            int cut = Math.max(here.lastIndexOf('.'), here.lastIndexOf('['));
            here = cut < 0 ? "" : here.substring(0, cut);
        }
        return Optional.empty();
    }

    /** True where the row is to be written: it is not left out. */
    boolean keeps(Place row) {
        return !leftOut.contains(row.row());
    }

    /** Remembers where the value at a JSON path came from. */
    void remember(String path, Place place) {
        places.put(path, place);
    }

    /** Puts a typed text into the JSON, unless it is blank, and remembers its field either way. */
    void put(ObjectNode node, String path, String name, String typed, Place place) {
        remember(path + "." + name, place);
        if (!typed.isBlank()) {
            node.put(name, typed.strip());
        }
    }

    /** Names a field that must be filled; its row is left out. */
    void require(String typed, Place place) {
        if (typed.isBlank()) {
            fault(place, Fault.of("required", "$." + place.section().id() + "." + place.field()));
        }
    }

    /** Names a fault of the form itself; its row is left out. */
    void fault(Place place, Fault fault) {
        if (keeps(place)) {
            faults.add(new RowFault(place.row(), place.fault(fault)));
        }
    }

    private void person(PersonForm form, LocalDate today) {
        personUntouched = Typed.allBlank(form.sex(), form.bornOn(), form.assessedOn())
                && form.behaviours().stream().allMatch(PersonForm.BehaviourRow::isBlank);
        personIncomplete = form.sex().isBlank() || form.bornOn().isBlank();
        assessedOnTyped = !form.assessedOn().isBlank();
        Place core = new Place(Section.PERSON, "person", "", false);
        json.put("assessedOn", assessedOnTyped ? form.assessedOn().strip() : today.toString());
        remember("$.assessedOn", core.at("assessedOn"));
        ObjectNode applicant = json.putObject("applicant");
        remember("$.applicant", core.at("sex"));
        put(applicant, "$.applicant", "sex", form.sex(), core.at("sex"));
        put(applicant, "$.applicant", "bornOn", form.bornOn(), core.at("bornOn"));
        if (!personUntouched) {
            require(form.sex(), core.at("sex"));
            require(form.bornOn(), core.at("bornOn"));
        }
        ObjectNode behaviours = applicant.putObject("behaviours");
        // By name, as canonical JSON has them: what is recorded then reads back in the same order.
        IntStream.range(0, form.behaviours().size())
                .boxed()
                .sorted(Comparator.comparing(i -> form.behaviours().get(i).behaviour()))
                .forEach(i -> behaviour(behaviours, form.behaviours().get(i), "behaviours[" + i + "]"));
    }

    private void behaviour(ObjectNode behaviours, PersonForm.BehaviourRow row, String field) {
        Place place = new Place(Section.PERSON, "person." + field, field + ".level", true);
        if (row.isBlank() || !keeps(place)) {
            return;
        }
        require(row.level(), place);
        String path = "$.applicant.behaviours." + row.behaviour();
        remember(path, place);
        ObjectNode node = behaviours.putObject(row.behaviour());
        put(node, path, "level", row.level(), place);
        put(node, path, "since", row.since(), place.at(field + ".since"));
        put(node, path, "left", row.left(), place.at(field + ".left"));
    }

    /** Each section's part of the JSON. */
    Map<Section, String> validParts(boolean personValid) {
        Map<Section, String> parts = new EnumMap<>(Section.class);
        ObjectNode person = JsonNodeFactory.instance.objectNode();
        if (personValid && !personIncomplete) {
            if (assessedOnTyped) {
                person.set("assessedOn", json.path("assessedOn"));
            }
            person.set("applicant", json.path("applicant"));
        }
        parts.put(Section.PERSON, person.toString());
        parts.put(Section.STATEMENTS, part("statements", "findings"));
        parts.put(Section.HISTORY, part("history"));
        parts.put(Section.WHAT_IFS, part("whatIfs"));
        parts.put(Section.COVER, part("cover"));
        return parts;
    }

    private String part(String... names) {
        ObjectNode part = JsonNodeFactory.instance.objectNode();
        for (String name : names) {
            if (json.has(name)) {
                part.set(name, json.path(name));
            }
        }
        return part.toString();
    }

    /** Adds an object to an array and remembers its row. */
    ObjectNode append(ArrayNode array, String arrayPath, Place place) {
        remember(arrayPath + "[" + array.size() + "]", place);
        return array.addObject();
    }
}
