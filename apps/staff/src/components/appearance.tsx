"use client";
import { Menu } from "@base-ui/react/menu";
import { useEffect, useState } from "react";

interface Setting {
  readonly label: string;
  /** Both the data attribute of the page and the name under which this browser remembers it. */
  readonly name: "theme" | "density";
  readonly values: readonly string[];
  /** What it is called while nothing is chosen. */
  readonly unset: string;
}

const paper: Setting = { label: "Paper", name: "theme", values: ["light", "dark"], unset: "as the system" };
const lines: Setting = {
  label: "Lines",
  name: "density",
  values: ["compact", "regular", "touch"],
  unset: "as the screen",
};

/** Steps one setting of the page through its values and back to none; this browser remembers it. */
function Stepped({ setting }: { setting: Setting }) {
  const [value, setValue] = useState<string | null>(null);
  useEffect(() => {
    setValue(window.localStorage.getItem(`withy.${setting.name}`));
  }, [setting]);
  const step = () => {
    const next = setting.values[value === null ? 0 : setting.values.indexOf(value) + 1] ?? null;
    setValue(next);
    if (next === null) {
      delete document.documentElement.dataset[setting.name];
      window.localStorage.removeItem(`withy.${setting.name}`);
    } else {
      document.documentElement.dataset[setting.name] = next;
      window.localStorage.setItem(`withy.${setting.name}`, next);
    }
  };
  return (
    <Menu.Item className="menuitem" closeOnClick={false} onClick={step}>
      <span className="grow">{setting.label}</span>
      <span className="soft">{value ?? setting.unset}</span>
    </Menu.Item>
  );
}

/** How the book looks in this browser: light or dark paper, narrow or wide lines. */
export function Appearance() {
  return (
    <>
      <Stepped setting={paper} />
      <Stepped setting={lines} />
    </>
  );
}
