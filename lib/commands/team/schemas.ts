import { z } from "zod";

export const createFirstTeamSchema = z.object({
  teamName: z
    .string()
    .trim()
    .min(1, "Give the team a name.")
    .max(80, "Keep it under 80 characters."),
  name: z.string().trim().min(1, "Write your name.").max(80, "Keep it under 80 characters."),
  email: z.email("Write an e-mail address, for example ada@example.com."),
  password: z
    .string()
    .min(10, "Use at least 10 characters.")
    .max(200, "Keep it under 200 characters."),
});
