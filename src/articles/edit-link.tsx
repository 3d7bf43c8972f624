import { reaches } from '../../server/people/roles.contract.ts'
import { useMe } from '../people/people.api.ts'
import { LinkButton } from '../ui/button.tsx'

/** Whether whoever is signed in writes articles; undefined until that is known. */
export function useWriter(): boolean | undefined {
  const { known, person } = useMe()
  return known ? person !== undefined && reaches(person.role, 'senior') : undefined
}

/** To where an article is changed, for who may. */
export function EditLink({ slug }: { slug: string }) {
  if (useWriter() !== true) return null
  return (
    <LinkButton to={`/articles/${slug}/edit`} size="small">
      Change this article
    </LinkButton>
  )
}
