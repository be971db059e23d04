import type { Metadata } from "next";
import { PlainPage } from "@/app/(public)/_components/plain-page";
import { PageHead } from "@/app/_components/ui";
import { cautionWords } from "@/lib/strings/cautions";

export const metadata: Metadata = { title: cautionWords.title };

export default function CautionsPage() {
  return (
    <PlainPage>
      <PageHead title={cautionWords.title} subtitle={cautionWords.subtitle} />
      <div className="reading">
        <p>
          <b>{cautionWords.lead}</b> {cautionWords.urgent}
        </p>
        <ul className="ruled-list mt-4">
          {cautionWords.points.map((point) => (
            <li key={point.title}>
              <b>{point.title}</b> {point.text}
            </li>
          ))}
        </ul>
      </div>
    </PlainPage>
  );
}
