"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { problemForForm, sendJson } from "@/app/_hooks/use-api";
import { Button, ButtonLink, Notice, TextInput } from "@/app/_components/ui";
import { choosePasswordForm, type ChoosePassword } from "@/lib/schemas/sign-in";
import { invitationWords } from "@/lib/strings/sign-in";

const FIELDS = ["name", "email", "password"] as const;

/** For somebody invited, or for the first quality lead, who has no email here yet. */
export function ChoosePasswordForm({ token, email }: { token: string; email: string | null }) {
  const [failure, setFailure] = useState<string | null>(null);
  const [isDone, setIsDone] = useState(false);
  const form = useForm<ChoosePassword>({
    resolver: zodResolver(choosePasswordForm(email)),
    mode: "onTouched",
    defaultValues: { email: "", name: "", password: "", again: "" },
  });
  const { errors, isSubmitting } = form.formState;

  async function send({ name, email: typed, password }: ChoosePassword) {
    setFailure(null);
    const who = email === null ? { name, email: typed } : {};
    const sent = await sendJson("POST", "/api/invitations", { token, password, ...who });
    if (sent.ok) return setIsDone(true);
    const { fieldErrors, rest } = problemForForm(sent.problem, FIELDS);
    for (const { name: field, message } of fieldErrors) form.setError(field, { message });
    setFailure(rest);
  }

  if (isDone) {
    return (
      <>
        <Notice mark="saved" live="status">
          {invitationWords.done}
        </Notice>
        <ButtonLink className="mt-4" look="primary" href="/sign-in">
          {invitationWords.toSignIn}
        </ButtonLink>
      </>
    );
  }
  return (
    <form
      className="sign-in-form"
      method="post"
      noValidate
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      {email === null ? (
        <WhoFields form={form} />
      ) : (
        <p className="mb-3">
          {invitationWords.intro} <b>{email}</b>
          {/* For password managers, which keep the two together. */}
          <input type="hidden" autoComplete="username" value={email} readOnly />
        </p>
      )}
      <TextInput
        id="password"
        type="password"
        autoComplete="new-password"
        label={invitationWords.password}
        hint={invitationWords.passwordHint}
        error={errors.password?.message}
        {...form.register("password")}
      />
      <TextInput
        id="again"
        type="password"
        autoComplete="new-password"
        label={invitationWords.again}
        error={errors.again?.message}
        {...form.register("again")}
      />
      {failure ? (
        <Notice mark="fix" live="alert" className="mb-3">
          {failure}
        </Notice>
      ) : null}
      <Button look="primary" type="submit" disabled={isSubmitting}>
        {isSubmitting ? invitationWords.submitting : invitationWords.submit}
      </Button>
    </form>
  );
}

function WhoFields({ form }: { form: ReturnType<typeof useForm<ChoosePassword>> }) {
  const { errors } = form.formState;
  return (
    <>
      <TextInput
        id="name"
        autoComplete="name"
        label={invitationWords.name}
        error={errors.name?.message}
        {...form.register("name")}
      />
      <TextInput
        id="email"
        type="email"
        autoComplete="username"
        label={invitationWords.email}
        error={errors.email?.message}
        {...form.register("email")}
      />
    </>
  );
}
