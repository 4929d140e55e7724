/** A fault begins with what is wrong, in bold: "Not a number. Found “0,1x”. Expected a number above 0." */
export function FaultText({ id, text }: { id?: string; text: string }) {
  const end = text.search(/[.:](\s|$)/) + 1;
  return (
    <p id={id} className="mt-1 text-note text-fail-text">
      <b>{text.slice(0, end)}</b>
      {text.slice(end)}
    </p>
  );
}
