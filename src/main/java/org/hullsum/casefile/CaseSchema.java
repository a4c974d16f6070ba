package org.hullsum.casefile;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import org.hullsum.problem.InternalFault;

/**
 * The JSON Schema (draft 2020-12) of the case format, as far as this version reads it, for editors.
 * It knows the structure only: names, units and dimensions are checked by {@link CaseReader}.
 */
public final class CaseSchema {
  private static final String RESOURCE = "hullsum-case-1.schema.json";

  private CaseSchema() {}

  /** The schema as JSON text that ends with a line feed. */
  public static String text() {
    try (InputStream in = CaseSchema.class.getResourceAsStream(RESOURCE)) {
      if (in == null) {
        throw new InternalFault("the resource " + RESOURCE + " is part of the program");
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new InternalFault("the resource " + RESOURCE + " can be read: " + e.getMessage());
    }
  }
}
