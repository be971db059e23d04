import { route } from "@/lib/http";
import { hospitalSchema, updateHospitalSchema } from "@/lib/schemas/hospital";
import { getHospital, updateHospital } from "@/lib/services/hospital";

export const GET = route({
  summary: "Name, time zone, due day and holidays of the hospital",
  response: hospitalSchema,
  run: ({ ctx }) => getHospital({ ctx }),
});

export const PATCH = route({
  summary: "Change the hospital's settings; returns that are open keep their due day",
  body: updateHospitalSchema,
  response: hospitalSchema,
  run: ({ ctx, body }) => updateHospital({ ctx, input: body }),
});
