/** A sentence at the top of the page about what just could not be done, or is on its way. */
export function Notice({ text, onClose }: { text: string; onClose: () => void }) {
  return (
    <div className="notice row" role="alert">
      <span />
      <p>
        {text}{" "}
        <button type="button" className="action" onClick={onClose}>
          Close
        </button>
      </p>
    </div>
  );
}
