import type { ComponentProps, ReactNode } from "react";

export type CheckProps = Omit<ComponentProps<"input">, "children"> & {
  type?: "checkbox" | "radio";
  children: ReactNode;
};

/** A tick box or radio button with its words; several of them stand in a `FieldGroup`. */
export function Check({ type = "checkbox", children, ...rest }: CheckProps) {
  return (
    <label className="check">
      <input {...rest} type={type} />
      <span>{children}</span>
    </label>
  );
}
