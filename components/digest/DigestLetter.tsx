/** The letter as a mail program shows it: in a frame of its own that runs nothing; its links open beside it. */
export function DigestLetter({ html, subject }: { html: string; subject: string }) {
  return (
    <figure>
      <figcaption className="mb-2 font-semibold">{subject}</figcaption>
      <iframe
        title="The digest as it is sent"
        sandbox="allow-popups allow-popups-to-escape-sandbox"
        srcDoc={html.replace('<head>', '<head><base target="_blank">')}
        className="h-dvh w-full rounded-hull border-2 border-edge bg-raised"
      />
    </figure>
  );
}
