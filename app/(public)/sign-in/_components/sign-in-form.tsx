"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { signIn } from "next-auth/react";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { Button, DataTable, Notice, TextInput } from "@/app/_components/ui";
import { signInSchema, type SignInInput } from "@/lib/schemas/sign-in";
import { demoAccounts, signInWords } from "@/lib/strings/sign-in";
import { refusalWords } from "./refusal-words";

interface SignInFormProps {
  hospitalName: string;
  /** Where to go on to; a path of this site. */
  from: string;
  /** From the address, where a form without scripts was sent. */
  refused: boolean;
  isDemo: boolean;
}

export function SignInForm({ hospitalName, from, refused, isDemo }: SignInFormProps) {
  const [failure, setFailure] = useState<string | null>(refused ? signInWords.wrong : null);
  const [isLeaving, setIsLeaving] = useState(false);
  const form = useForm<SignInInput>({ resolver: zodResolver(signInSchema), mode: "onSubmit" });
  const { errors, isSubmitting } = form.formState;
  const isBusy = isSubmitting || isLeaving;

  async function send({ email, password }: SignInInput) {
    setFailure(null);
    const answer = await signIn("credentials", { redirect: false, email, password }).catch(() => null);
    if (answer?.ok && !answer.error) {
      setIsLeaving(true);
      // Loaded anew, so that nothing of an earlier person is left in this tab.
      window.location.assign(from);
      return;
    }
    setFailure(refusalWords(answer));
    form.setFocus("password");
  }

  return (
    // Before the scripts have run, a sent form must not put the password into the address: hence "post".
    <form
      className="sign-in-form"
      method="post"
      action="/api/auth/callback/credentials"
      noValidate
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <h1 className="sr-only">{signInWords.heading}</h1>
      <p className="sign-in-hospital">{hospitalName}</p>
      <TextInput
        id="email"
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        label={signInWords.email}
        error={errors.email?.message}
        {...form.register("email")}
      />
      <TextInput
        id="password"
        type="password"
        autoComplete="current-password"
        label={signInWords.password}
        error={errors.password?.message ?? failure}
        {...form.register("password")}
      />
      <div aria-live="assertive" className="sr-only">
        {failure}
      </div>
      <div className="sign-in-go">
        <Button look="primary" type="submit" disabled={isBusy}>
          {isBusy ? signInWords.submitting : signInWords.submit}
        </Button>
        <details className="sign-in-help">
          <summary>{signInWords.cannot}</summary>
          <p className="hint">{signInWords.cannotHelp}</p>
        </details>
      </div>
      <p className="hint mt-3">{signInWords.idle}</p>
      {isDemo ? (
        <DemoAccounts
          onUse={(email) => {
            form.setValue("email", email);
            form.setFocus("password");
          }}
        />
      ) : null}
    </form>
  );
}

function DemoAccounts({ onUse }: { onUse: (email: string) => void }) {
  return (
    <Notice className="demo-accounts mt-4" title={`${signInWords.demoTitle}.`}>
      {signInWords.demoNote}
      <DataTable caption={signInWords.demoTitle} hideCaption look="tight">
        <tbody>
          {demoAccounts.map(({ email, who }) => (
            <tr key={email}>
              <th scope="row">
                {email}
                <small>{who}</small>
              </th>
              <td>
                <Button look="text" aria-label={signInWords.demoUseFor(email)} onClick={() => onUse(email)}>
                  {signInWords.demoUse}
                </Button>
              </td>
            </tr>
          ))}
        </tbody>
      </DataTable>
    </Notice>
  );
}
