// breaks: no-sql-in-routes
import 'typeorm'
// breaks: no-sql-in-routes
import 'pg'
