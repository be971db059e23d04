import { Link } from "@/app/_components/ui/link";
import { ThemeSwitch } from "@/app/_components/frame/theme-switch";
import { frameWords } from "@/lib/strings/frame";

export interface FooterProps {
  links?: { href: string; label: string }[];
}

/** The caution that stands under every page, and the few links that belong to none. */
export function Footer({ links = [] }: FooterProps) {
  return (
    <footer className="footer">
      <p className="care">
        {frameWords.signalCaution} {frameWords.countsOnly}
      </p>
      <div className="footer-links">
        {links.map((link) => (
          <Link key={link.href} href={link.href}>
            {link.label}
          </Link>
        ))}
        <ThemeSwitch />
      </div>
    </footer>
  );
}
