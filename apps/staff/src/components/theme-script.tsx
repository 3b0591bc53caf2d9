/** Sets the remembered paper and lines before the first paint, so that a dark page never flashes light. The code is a constant of our own. */
export function ThemeScript({ nonce }: { nonce: string }) {
  const code = `try{var d=document.documentElement.dataset,s=localStorage,t=s.getItem("withy.theme"),l=s.getItem("withy.density");if(t==="light"||t==="dark")d.theme=t;if(l==="compact"||l==="regular"||l==="touch")d.density=l}catch(e){}`;
  return <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: code }} />;
}
