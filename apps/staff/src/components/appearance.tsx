"use client";
import { Menu } from "@base-ui/react/menu";
import { useEffect, useState } from "react";

type Theme = "system" | "light" | "dark";
const words: Record<Theme, string> = { system: "as the system", light: "light", dark: "dark" };
const order: readonly Theme[] = ["system", "light", "dark"];

function apply(theme: Theme) {
  if (theme === "system") delete document.documentElement.dataset["theme"];
  else document.documentElement.dataset["theme"] = theme;
}

/** Steps through light, dark and the system's own; remembered in this browser. */
export function Appearance() {
  const [theme, setTheme] = useState<Theme>("system");
  useEffect(() => {
    const stored = window.localStorage.getItem("withy.theme");
    if (stored === "light" || stored === "dark") setTheme(stored);
  }, []);
  const step = () => {
    const next = order[(order.indexOf(theme) + 1) % order.length] ?? "system";
    setTheme(next);
    apply(next);
    window.localStorage.setItem("withy.theme", next);
  };
  return (
    <Menu.Item className="menuitem" closeOnClick={false} onClick={step}>
      <span className="grow">Paper</span>
      <span className="soft">{words[theme]}</span>
    </Menu.Item>
  );
}
