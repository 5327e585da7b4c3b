// breaks: contracts-know-zod
import 'mathjs'
