/** Why a form was not taken: below its fields, read out at once. */
export function SaidWrong({ says }: { readonly says: string | null }) {
  return (
    <p className="said-wrong" role="alert">
      {says}
    </p>
  );
}
