import { makeImage } from "./image";

export default async function setup(): Promise<void> {
  await makeImage();
}
