package blochbound.report;

import blochbound.model.DesignCase;
import blochbound.model.Requirement;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import com.fasterxml.jackson.core.util.Separators.Spacing;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;

/**
 * Writes the fields of a JSON document in order: decimals with all their digits, doubles with the
 * fewest digits that read back the same, values that are missing or not finite as null.
 */
final class JsonFields {
  private final JsonGenerator generator;

  private JsonFields(JsonGenerator generator) {
    this.generator = generator;
  }

  /** Something that writes and may fail as a stream does; in memory it never does. */
  interface Content {
    /** Writes into the fields. */
    void write(JsonFields fields) throws IOException;
  }

  /** A document in UTF-8 that ends with a line end. */
  static byte[] document(Content content) {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    try {
      try (JsonGenerator generator = new JsonFactory().createGenerator(bytes)) {
        DefaultIndenter lines = new DefaultIndenter("  ", "\n");
        Separators separators =
            Separators.createDefaultInstance().withObjectFieldValueSpacing(Spacing.AFTER);
        generator.setPrettyPrinter(
            new DefaultPrettyPrinter(separators)
                .withObjectIndenter(lines)
                .withArrayIndenter(lines));
        content.write(new JsonFields(generator));
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    bytes.write('\n');
    return bytes.toByteArray();
  }

  /** A nameless object. */
  void object(Content content) throws IOException {
    generator.writeStartObject();
    content.write(this);
    generator.writeEndObject();
  }

  /** A nameless array with one object for each item. */
  <T> void array(List<T> items, Element<T> element) throws IOException {
    generator.writeStartArray();
    for (T item : items) {
      object(fields -> element.write(fields, item));
    }
    generator.writeEndArray();
  }

  /**
   * Writes the fields of one item.
   *
   * @param <T> kind of the items
   */
  interface Element<T> {
    /** Writes the item. */
    void write(JsonFields fields, T item) throws IOException;
  }

  void object(String name, Content content) throws IOException {
    generator.writeFieldName(name);
    object(content);
  }

  /** A named object, or null when there is nothing to write. */
  <T> void object(String name, Optional<T> item, Element<T> element) throws IOException {
    if (item.isPresent()) {
      object(name, fields -> element.write(fields, item.get()));
    } else {
      generator.writeNullField(name);
    }
  }

  <T> void array(String name, List<T> items, Element<T> element) throws IOException {
    generator.writeFieldName(name);
    array(items, element);
  }

  void strings(String name, List<String> values) throws IOException {
    generator.writeArrayFieldStart(name);
    for (String value : values) {
      generator.writeString(value);
    }
    generator.writeEndArray();
  }

  void text(String name, String value) throws IOException {
    generator.writeStringField(name, value);
  }

  /** A text, or null when there is none. */
  void text(String name, Optional<String> value) throws IOException {
    if (value.isPresent()) {
      text(name, value.get());
    } else {
      generator.writeNullField(name);
    }
  }

  void truth(String name, boolean value) throws IOException {
    generator.writeBooleanField(name, value);
  }

  void integer(String name, long value) throws IOException {
    generator.writeNumberField(name, value);
  }

  void decimal(String name, BigDecimal value) throws IOException {
    generator.writeFieldName(name);
    generator.writeNumber(NumberText.exact(value));
  }

  void real(String name, double value) throws IOException {
    generator.writeFieldName(name);
    if (Double.isFinite(value)) {
      generator.writeNumber(NumberText.shortest(value));
    } else {
      generator.writeNull();
    }
  }

  /** What identifies a case. */
  void identity(DesignCase designCase) throws IOException {
    text("title", designCase.title());
    text("sha256", designCase.sha256());
  }

  /** What a requirement demands. */
  void demand(Requirement requirement) throws IOException {
    text("name", requirement.name());
    text("measure", requirement.measureText());
    text("sense", requirement.sense().key());
    decimal("limit", requirement.limit());
    text("unit", requirement.unit().symbol());
  }
}
