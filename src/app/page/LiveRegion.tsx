import { useEffect, useState } from "react";

/** Nothing is said before the findings have rested for so long. */
export const restBeforeSpeech = 400;

/** The one polite voice of the page: what changed, once it has come to rest. */
export function LiveRegion({ text }: { text: string }) {
  const [spoken, speak] = useState("");
  useEffect(() => {
    const timer = setTimeout(() => {
      // the ruler speaks for itself: two voices at once are none
      if (!document.activeElement?.closest(".ruler")) speak(text);
    }, restBeforeSpeech);
    return () => clearTimeout(timer);
  }, [text]);
  return (
    <div className="spoken" role="status">
      {spoken}
    </div>
  );
}
