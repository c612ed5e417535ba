/** The sign of a doubt: a small flag, a shape and never a colour. */
export function Pennant() {
  return (
    <svg width="12" height="12" viewBox="0 0 12 12" strokeWidth="1.2" aria-hidden="true">
      <path d="M1.5 11.5V1.2H10L7.8 4L10 6.8H1.5" />
    </svg>
  );
}
