export { Footer } from "@/app/_components/frame/footer";
export { Masthead, type MastheadLink } from "@/app/_components/frame/masthead";
export { ThemeScript } from "@/app/_components/frame/theme-script";
export { ThemeSwitch } from "@/app/_components/frame/theme-switch";
export { Wordmark } from "@/app/_components/frame/wordmark";
export { YearScale } from "@/app/_components/frame/year-scale";
