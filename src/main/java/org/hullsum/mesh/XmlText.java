package org.hullsum.mesh;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.ReadableByteChannel;
import javax.xml.stream.XMLStreamConstants;
import javax.xml.stream.XMLStreamException;
import javax.xml.stream.XMLStreamReader;

/**
 * The text of the element at whose start the parser stands, without that of elements inside it.
 * When all has been read, the parser stands at the end of the element.
 */
final class XmlText implements ReadableByteChannel {
  private final XMLStreamReader xml;
  private int depth = 1;
  private int from;
  private int length;

  XmlText(XMLStreamReader xml) {
    this.xml = xml;
  }

  @Override
  public int read(ByteBuffer target) throws IOException {
    try {
      while (length == 0 && depth > 0) {
        next();
      }
    } catch (XMLStreamException broken) {
      throw new CarriedFault(VtkXmlFile.fault(broken));
    }
    if (length == 0) {
      return -1;
    }
    char[] text = xml.getTextCharacters();
    int count = Math.min(length, target.remaining());
    for (int k = 0; k < count; k++) {
      char letter = text[from + k];
      target.put((byte) (letter < 0x80 ? letter : '?'));
    }
    from += count;
    length -= count;
    return count;
  }

  private void next() throws XMLStreamException {
    switch (xml.next()) {
      case XMLStreamConstants.START_ELEMENT -> depth++;
      case XMLStreamConstants.END_ELEMENT -> depth--;
      case XMLStreamConstants.CHARACTERS, XMLStreamConstants.CDATA, XMLStreamConstants.SPACE -> {
        if (depth == 1) {
          from = xml.getTextStart();
          length = xml.getTextLength();
        }
      }
      default -> {}
    }
  }

  /** Passes what is left of the element. */
  void skip() throws IOException {
    ByteBuffer unread = ByteBuffer.allocate(1 << 10);
    while (read(unread) >= 0) {
      unread.clear();
    }
  }

  @Override
  public boolean isOpen() {
    return true;
  }

  @Override
  public void close() {}
}
