"use client";
import { useEffect, useState } from "react";

export interface ToastMessage {
  id: string;
  said: string;
  /** What can be done about it at once. */
  action?: { label: string; run: () => void } | undefined;
}

const shownMs = 8000;

/** Short messages at the foot of the window. They go by themselves, but not while they are pointed at or focused. */
export function Toasts({
  messages,
  onGone,
}: {
  messages: readonly ToastMessage[];
  onGone: (id: string) => void;
}) {
  return (
    <div className="toasts" role="status" aria-live="polite">
      {messages.map((message) => (
        <OneToast key={message.id} message={message} onGone={onGone} />
      ))}
    </div>
  );
}

function OneToast({ message, onGone }: { message: ToastMessage; onGone: (id: string) => void }) {
  const { id, said, action } = message;
  const [isHeld, setIsHeld] = useState(false);
  useEffect(() => {
    if (isHeld) return;
    const timer = setTimeout(() => onGone(id), shownMs);
    return () => clearTimeout(timer);
  }, [isHeld, id, onGone]);
  const hold = () => setIsHeld(true);
  const release = () => setIsHeld(false);
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: pointing at it only keeps it from going away
    <div
      className="toast lifted"
      onPointerEnter={hold}
      onPointerLeave={release}
      onFocus={hold}
      onBlur={release}
    >
      <span>{said}</span>
      {action && (
        <button
          type="button"
          className="btn"
          data-kind="plain"
          data-size="small"
          onClick={() => {
            action.run();
            onGone(id);
          }}
        >
          {action.label}
          <span className="vh">: {said}</span>
        </button>
      )}
    </div>
  );
}
