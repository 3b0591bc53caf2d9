/** Sets the remembered theme before the first paint, so that a dark page never flashes light. */
export function ThemeScript({ nonce }: { nonce: string }) {
  const code = `try{var t=localStorage.getItem("withy.theme");if(t==="light"||t==="dark")document.documentElement.dataset.theme=t}catch(e){}`;
  // biome-ignore lint/security/noDangerouslySetInnerHtml: a constant of our own; it must run before the page paints
  return <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: code }} />;
}
