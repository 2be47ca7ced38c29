/** Answers that are files. */

/** `attachment; filename=…` for any name: plain letters for old readers, the name itself as RFC 6266 and 8187 have it. */
export function disposition(kind: "attachment" | "inline", fileName: string): string {
  const plain = fileName.replace(/[^\w. ()-]/g, "_");
  const whole = encodeURIComponent(fileName).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16)}`);
  return `${kind}; filename="${plain}"; filename*=UTF-8''${whole}`;
}

/** A text that is made while it is taken, as a file to keep. The first piece is made at once, so that a refusal is an answer. */
export function textDownload(pieces: Iterator<string>, mediaType: string, fileName: string): Response {
  const encoder = new TextEncoder();
  let next = pieces.next();
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      if (next.done) controller.close();
      else {
        controller.enqueue(encoder.encode(next.value));
        next = pieces.next();
      }
    },
  });
  const headers = {
    "Content-Type": `${mediaType}; charset=utf-8`,
    "Content-Disposition": disposition("attachment", fileName),
    "Cache-Control": "no-store",
  };
  return new Response(body, { headers });
}

interface KeptFile {
  fileName: string;
  mediaType: string;
  content: Uint8Array<ArrayBuffer>;
}

/**
 * A file that somebody sent in, given out again. Whatever is in it, nothing of it runs: the browser takes its type as said,
 * keeps it rather than shows it unless asked, and what it shows is shut in a sandbox without scripts.
 */
export function fileAnswer({ fileName, mediaType, content }: KeptFile, kind: "attachment" | "inline"): Response {
  return new Response(content, {
    headers: {
      "Content-Type": mediaType.startsWith("text/") ? `${mediaType}; charset=utf-8` : mediaType,
      "Content-Length": String(content.byteLength),
      "Content-Disposition": disposition(kind, fileName),
      "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'; sandbox",
      "X-Content-Type-Options": "nosniff",
      "Cross-Origin-Resource-Policy": "same-origin",
      "Cache-Control": "private, no-store",
    },
  });
}
