package org.hullsum.report;

import com.fasterxml.jackson.core.JsonEncoding;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.Closeable;
import java.io.IOException;
import java.io.OutputStream;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.numeric.Vector3;
import org.hullsum.problem.InternalFault;

/**
 * A JSON document being written: a generator with the rules of our documents (null for what does
 * not exist, shortest numbers, line feeds). Closing it flushes the stream and leaves it open. Not
 * thread-safe.
 */
final class JsonDocument implements Closeable {
  private final JsonGenerator generator;

  private JsonDocument(JsonGenerator generator) {
    this.generator = generator;
  }

  static JsonDocument to(OutputStream out) throws IOException {
    JsonFactory factory =
        JsonFactory.builder().enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER).build();
    JsonGenerator generator = factory.createGenerator(out, JsonEncoding.UTF8);
    generator.disable(JsonGenerator.Feature.AUTO_CLOSE_TARGET);
    DefaultPrettyPrinter printer = new DefaultPrettyPrinter();
    printer.indentObjectsWith(new DefaultIndenter("  ", "\n"));
    generator.setPrettyPrinter(printer);
    return new JsonDocument(generator);
  }

  void beginObject() throws IOException {
    generator.writeStartObject();
  }

  void beginObject(String key) throws IOException {
    generator.writeObjectFieldStart(key);
  }

  void endObject() throws IOException {
    generator.writeEndObject();
  }

  void beginArray(String key) throws IOException {
    generator.writeArrayFieldStart(key);
  }

  void endArray() throws IOException {
    generator.writeEndArray();
  }

  void absent(String key) throws IOException {
    generator.writeNullField(key);
  }

  void text(String key, String value) throws IOException {
    generator.writeStringField(key, value);
  }

  void optionalText(String key, Optional<String> value) throws IOException {
    if (value.isPresent()) {
      text(key, value.get());
    } else {
      absent(key);
    }
  }

  void texts(String key, List<String> values) throws IOException {
    beginArray(key);
    for (String value : values) {
      generator.writeString(value);
    }
    endArray();
  }

  void count(String key, long value) throws IOException {
    generator.writeNumberField(key, value);
  }

  void flag(String key, boolean value) throws IOException {
    generator.writeBooleanField(key, value);
  }

  void number(String key, double value) throws IOException {
    generator.writeFieldName(key);
    writeNumber(value);
  }

  void optionalNumber(String key, Optional<Double> value) throws IOException {
    number(key, value.orElse(Double.NaN));
  }

  void numbers(String key, List<Double> values) throws IOException {
    beginArray(key);
    for (double value : values) {
      writeNumber(value);
    }
    endArray();
  }

  void counts(String key, List<Integer> values) throws IOException {
    beginArray(key);
    for (int value : values) {
      generator.writeNumber(value);
    }
    endArray();
  }

  void optionalVector(String key, Optional<Vector3> vector) throws IOException {
    if (vector.isPresent()) {
      Vector3 v = vector.get();
      numbers(key, List.of(v.x(), v.y(), v.z()));
    } else {
      absent(key);
    }
  }

  /** The evidence of a finding: named values of the kinds that {@code Finding} allows. */
  void evidence(String key, Map<String, Object> values) throws IOException {
    beginObject(key);
    for (Map.Entry<String, Object> entry : values.entrySet()) {
      generator.writeFieldName(entry.getKey());
      writeEvidence(entry.getValue());
    }
    endObject();
  }

  private void writeEvidence(Object value) throws IOException {
    if (value instanceof Double number) {
      writeNumber(number);
    } else if (value instanceof double[] numbers) {
      writeEvidence(Arrays.stream(numbers).boxed().toList());
    } else if (value instanceof Integer || value instanceof Long) {
      generator.writeNumber(((Number) value).longValue());
    } else if (value instanceof Boolean flag) {
      generator.writeBoolean(flag);
    } else if (value instanceof String text) {
      generator.writeString(text);
    } else if (value instanceof List<?> items) {
      generator.writeStartArray();
      for (Object item : items) {
        writeEvidence(item);
      }
      generator.writeEndArray();
    } else {
      throw new InternalFault("evidence of type " + value.getClass().getName());
    }
  }

  private void writeNumber(double value) throws IOException {
    if (Double.isFinite(value)) {
      generator.writeNumber(value);
    } else {
      generator.writeNull();
    }
  }

  /** Ends the last line and flushes; the stream beneath stays open. */
  @Override
  public void close() throws IOException {
    generator.writeRaw('\n');
    generator.close();
  }
}
