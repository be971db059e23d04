import { authHandler } from "@/lib/http/auth-handler";

export { authHandler as GET, authHandler as POST };
