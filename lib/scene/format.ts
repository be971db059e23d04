/** Numbers and months as the interface writes them; they stand a rank lower, where sentences need them too. */
export * from "@/lib/indicators/chart-format";
