import type { ComponentProps, ElementType, ReactNode } from "react";
import { classNames } from "./class-names";
import { Key } from "./key";

export type ButtonKind = "primary" | "quiet" | "stop" | "plain";

interface ButtonLook {
  /** One primary a screen, its verb and amount on it; "stop" for what cannot be taken back; "plain" reads as a link. */
  kind?: ButtonKind;
  size?: "usual" | "small" | "wide";
  /** The shortcut that does the same, printed on the button. */
  shortcut?: string | undefined;
  children: ReactNode;
}

export type ButtonProps = ButtonLook &
  Omit<ComponentProps<"button">, "children"> & {
    /** Work is under way: further presses are ignored and readers are told. */
    busy?: boolean;
  };

function look(kind: ButtonKind, size: string, className: string | undefined) {
  return { className: classNames("btn", className), "data-kind": kind, "data-size": size };
}

export function Button(props: ButtonProps) {
  const {
    kind = "quiet",
    size = "usual",
    shortcut,
    busy = false,
    className,
    children,
    onClick,
    ...rest
  } = props;
  return (
    <button
      type="button"
      {...rest}
      {...look(kind, size, className)}
      aria-busy={busy || undefined}
      aria-disabled={busy || undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
    >
      {children}
      {shortcut !== undefined && <Key>{shortcut}</Key>}
    </button>
  );
}

export type ButtonLinkProps = ButtonLook &
  Omit<ComponentProps<"a">, "children"> & {
    href: string;
    /** The router's link component; a plain anchor without it. */
    as?: ElementType;
  };

/** A link that looks like a button: it goes somewhere, it does not do something. */
export function ButtonLink(props: ButtonLinkProps) {
  const { as: Link = "a", kind = "quiet", size = "usual", shortcut, className, children, ...rest } = props;
  return (
    <Link {...rest} {...look(kind, size, className)}>
      {children}
      {shortcut !== undefined && <Key>{shortcut}</Key>}
    </Link>
  );
}

/** Buttons in a row, the main one first. */
export function Buttons({ children }: { children: ReactNode }) {
  return <div className="btns">{children}</div>;
}
