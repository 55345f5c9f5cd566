# Makes limits.json: normal model with sessions fixed for readings that stopped at a limit, by R survival survreg.
#   Rscript limits.R limits.json
suppressMessages({library(survival);library(jsonlite)})
opt <- options(digits=17)
num <- function(x) x
mk <- function(id, D, note) {
  S <- with(D, Surv(ifelse(limit=="at-most", NA, y), ifelse(limit=="at-least", NA, y), type="interval2"))
  D$S <- S
  ctl <- survreg.control(rel.tolerance=1e-15, maxiter=200)
  f <- survreg(S ~ block + treatment, data=D, dist="gaussian", control=ctl)
  f0 <- survreg(S ~ block, data=D, dist="gaussian", control=ctl)
  b <- coef(f); V <- vcov(f); nb <- nlevels(D$block); nt <- nlevels(D$treatment)
  means <- sapply(seq_len(nt), function(i){ l <- setNames(numeric(length(b)), names(b)); l[1] <- 1; l[2:nb] <- 1/nb; if(i>1) l[nb+i-1] <- 1; c(sum(l*b), sqrt(drop(t(l)%*%V[seq_along(b),seq_along(b)]%*%l)))})
  prs <- combn(nt,2); pr <- apply(prs,2,function(z){ l <- numeric(length(b)); for(k in 1:2) if(z[k]>1) l[nb+z[k]-1] <- l[nb+z[k]-1]+c(1,-1)[k]; c(sum(l*b), sqrt(drop(t(l)%*%V[seq_along(b),seq_along(b)]%*%l)))})
  sse <- sqrt(V[nrow(V),ncol(V)])*f$scale
  list(id=id, note=note, data=list(treatment=as.integer(D$treatment)-1, session=as.integer(D$block)-1, y=D$y, limit=D$limit),
   logLik=f$loglik[2], logLikWithout=f0$loglik[2], sigma=f$scale, sigmaSe=sse, means=list(estimate=means[1,], se=means[2,]),
   pairs=list(a=prs[1,]-1,b=prs[2,]-1,estimate=pr[1,],se=pr[2,]), lr=2*(f$loglik[2]-f0$loglik[2]), df=nt-1)
}
gen <- function(t,b,k,seed,cutU=Inf,cutL=-Inf){ set.seed(seed); cnt<-rep(0,t); tr<-bl<-integer(0)
 for(j in 1:b){ pick<-order(cnt+runif(t,0,.99))[1:k]; cnt[pick]<-cnt[pick]+1; tr<-c(tr,pick); bl<-c(bl,rep(j,k)) }
 te<-rnorm(t,0,2); be<-rnorm(b,0,2); y<-round(30+te[tr]+be[bl]+rnorm(b*k),2)
 lim<-ifelse(y>=cutU,"at-least",ifelse(y<=cutL,"at-most","none")); y<-pmin(pmax(y,cutL),cutU)
 data.frame(treatment=factor(tr),block=factor(bl),y=y,limit=lim,stringsAsFactors=FALSE) }
cases <- list(mk("right-6-3-12", gen(6,12,3,11,cutU=33), "right-censored at 32"), mk("both-8-4-12", gen(8,12,4,12,cutU=34.5,cutL=25.5), "left at 25.5 and right at 34.5"), mk("left-5-4-8", gen(5,8,4,13,cutL=26.5), "left-censored at 26.5"))
for(c in cases) cat(c$id, table(c$data$limit), c$logLik, c$sigma, "\n")
js <- function(x){ if(is.list(x)){ if(!is.null(names(x))) paste0("{",paste(sprintf('"%s":%s',names(x),sapply(x,js)),collapse=","),"}") else paste0("[",paste(sapply(x,js),collapse=","),"]") } else if(is.character(x)){ if(length(x)==1) toJSON(x,auto_unbox=TRUE) else toJSON(x)} else { s<-sapply(x,function(v){ for(d in 15:17){ z<-sprintf(paste0("%.",d,"g"),v); if(as.numeric(z)==v) return(z)}; z}); if(length(s)==1) s else paste0("[",paste(s,collapse=","),"]") } }
writeLines(js(list(schema="limits/1", source=paste("R", getRversion(), "survival", packageVersion("survival"), "survreg(Surv(.., type = 'interval2') ~ block + treatment, dist = 'gaussian', rel.tolerance = 1e-15); data invented with R's random number generator"), cases=cases)), commandArgs(TRUE)[1])
