import { z } from "zod";
import { storable } from "../storable-text";
import { ROLES } from "@/lib/auth/permissions";

const newPassword = z
  .string()
  .min(12, "Use at least 12 characters.")
  .max(200, "Keep it under 200 characters.");

export const createFirstTeamSchema = z.object({
  teamName: storable.trim().min(1, "Give the team a name.").max(80, "Keep it under 80 characters."),
  name: storable.trim().min(1, "Write your name.").max(80, "Keep it under 80 characters."),
  email: z.email("Write an e-mail address, for example ada@example.com."),
  password: newPassword,
});

const userId = z.uuid("Choose a member.");
const role = z.enum(ROLES, "Choose a role.");

export const addMemberSchema = z.object({
  name: storable.trim().min(1, "Write the person's name.").max(80, "Keep it under 80 characters."),
  email: z
    .email("Write an e-mail address, for example ada@example.com.")
    .max(320, "Keep it under 320 characters."),
  role,
  password: newPassword,
});

export const memberRefSchema = z.object({ userId });
export const changeRoleSchema = z.object({ userId, role });

export const changeOwnPasswordSchema = z
  .object({
    currentPassword: z.string().min(1, "Write your current password.").max(200),
    newPassword,
    repeated: z.string(),
  })
  .superRefine((values, context) => {
    const refuse = (field: string, message: string) =>
      context.addIssue({ code: "custom", path: [field], message });
    if (values.newPassword !== values.repeated) {
      refuse("repeated", "This is not the same as the new password.");
    }
    if (values.newPassword === values.currentPassword) {
      refuse("newPassword", "This is your current password.");
    }
  });
