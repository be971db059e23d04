import { themeStorageKey } from "@/app/_components/frame/theme";

/**
 * Sets the chosen theme before the page is painted. Runs under the page's nonce; the root element needs
 * `suppressHydrationWarning`, since its attribute is set before React takes over. A browser that keeps no storage
 * throws on reading it, and follows the system then.
 */
const script = `try{var t=localStorage.getItem(${JSON.stringify(themeStorageKey)});if(t==="light"||t==="dark")document.documentElement.dataset.theme=t}catch(e){}`;

export function ThemeScript({ nonce }: { nonce?: string }) {
  // Browsers empty a script's nonce attribute once it has run, which React would report as a difference.
  return <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: script }} />;
}
