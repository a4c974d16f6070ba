package org.hullsum.model;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import org.hullsum.field.VectorField;
import org.hullsum.problem.Place;
import org.hullsum.problem.Problem;
import org.hullsum.units.WorkingUnits;

/**
 * A case, read and checked: everything in it is consistent in names and dimensions.
 *
 * @param file the case file as the user named it
 * @param title empty where none is stated
 * @param about free text
 * @param quantity what is conserved
 * @param working the units of every number in the case
 * @param inputs parameters and inline figures
 * @param fields by name
 * @param volumes in the order of the file; empty where the patches bound nothing
 * @param patches in the order of the file
 * @param envelopes in the order of the file
 * @param schedule when it is audited
 * @param waivers in the order of the file
 * @param fieldPlaces where each field is stated
 * @param warnings what was accepted but is probably not what was meant
 * @param notes sentences that the report owes the reader, such as which gallon a unit was taken for
 * @param sources every file read, with its SHA-256
 * @param usedNames the parameters and fields that something in the file refers to, whether or not
 *     it left a trace in a formula
 */
public record Case(
    String file,
    Optional<String> title,
    Optional<String> about,
    ConservedQuantity quantity,
    WorkingUnits working,
    Inputs inputs,
    Map<String, VectorField> fields,
    List<Volume> volumes,
    List<Patch> patches,
    List<Envelope> envelopes,
    Schedule schedule,
    List<Waiver> waivers,
    Map<String, Place> fieldPlaces,
    List<Problem> warnings,
    List<String> notes,
    List<SourceFile> sources,
    Set<String> usedNames) {
  /**
   * A file that was read.
   *
   * @param file as the user named it
   * @param sha256 in lower-case hexadecimal
   */
  public record SourceFile(String file, String sha256) {
    public SourceFile {
      Objects.requireNonNull(file, "file");
      Objects.requireNonNull(sha256, "sha256");
    }
  }

  public Case {
    Objects.requireNonNull(file, "file");
    Objects.requireNonNull(title, "title");
    Objects.requireNonNull(about, "about");
    Objects.requireNonNull(quantity, "quantity");
    Objects.requireNonNull(working, "working");
    Objects.requireNonNull(inputs, "inputs");
    Objects.requireNonNull(schedule, "schedule");
    fields = Collections.unmodifiableMap(new LinkedHashMap<>(fields));
    fieldPlaces = Collections.unmodifiableMap(new LinkedHashMap<>(fieldPlaces));
    volumes = List.copyOf(volumes);
    patches = List.copyOf(patches);
    envelopes = List.copyOf(envelopes);
    waivers = List.copyOf(waivers);
    warnings = List.copyOf(warnings);
    notes = List.copyOf(notes);
    sources = List.copyOf(sources);
    usedNames = Set.copyOf(usedNames);
  }
}
